import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { renderToString } from 'preact-render-to-string';
import { h } from 'preact';
import { describe, expect, it } from 'vitest';
import { DataBlock, InlineText, policyHash, scriptJson } from '../../src/reports/html.js';

/** Text with the pieces that break out of scripts. */
const hostile = fc
  .array(fc.oneof(fc.string({ unit: 'binary' }), fc.constantFrom('</script>', '<!--', '<script', ']]>', '\u2028', '\u2029', '&lt;', '"')))
  .map((parts) => parts.join(''));

describe('scriptJson', () => {
  it('reads back as the same text and holds nothing that ends a script element', () => {
    fc.assert(
      fc.property(hostile, (text) => {
        const json = scriptJson({ text });
        expect(JSON.parse(json)).toEqual({ text });
        expect(json).not.toMatch(/[<\u2028\u2029]/);
      }),
    );
  });
});

describe('DataBlock', () => {
  it('stands in the page as it was made', () => {
    const json = scriptJson({ name: '</script><img src=x onerror=alert(1)>', and: '&amp; "quoted"' });
    const html = renderToString(h(DataBlock, { id: 'x', json }) as never);
    expect(html).toBe(`<script id="x" type="application/json">${json}</script>`);
  });

  it('refuses text that could end it', () => {
    expect(() => renderToString(h(DataBlock, { id: 'x', json: '"</script>"' }) as never)).toThrow('left unescaped');
  });
});

describe('InlineText', () => {
  it.each(['</script>', '</STYLE >', '<!--'])('refuses %s', (text) => {
    expect(() => renderToString(h(InlineText, { tag: 'script', text }) as never)).toThrow('end its element');
  });
});

describe('policyHash', () => {
  it('is the base64 of the SHA-256 of the text in UTF-8', () => {
    // Source: FIPS 180-4 example, SHA-256 of "abc".
    const hex = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';
    expect(policyHash('abc')).toBe(`'sha256-${Buffer.from(hex, 'hex').toString('base64')}'`);
    expect(policyHash('ä')).toContain(createHash('sha256').update(Buffer.from('ä', 'utf8')).digest('base64'));
  });
});
