import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { markdownTable, markdownText } from '../../src/reports/markdown.js';

describe('markdownText', () => {
  it.each([
    ['</script><img src=x onerror=alert(1)>', '&lt;/script&gt;&lt;img src=x onerror=alert(1)&gt;'],
    ['a|b', 'a\\|b'],
    ['[click](javascript:alert(1))', '\\[click\\](javascript:alert(1))'],
    ['line\nbreak', 'line break'],
    ['https://example.org', 'https:&#47;&#47;example.org'],
    ['www.example.org', 'www&#46;example.org'],
    ['*bold* `code` _it_', '\\*bold\\* \\`code\\` \\_it\\_'],
    ['a\\|b', 'a\\\\\\|b'],
  ])('makes %j harmless', (text, safe) => {
    expect(markdownText(text)).toBe(safe);
  });

  it('leaves no open bracket, no line break and no bare column mark in any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        const safe = markdownText(text);
        expect(safe).not.toMatch(/[<>\n\r\u2028\u2029]/);
        expect(safe.replaceAll('\\\\', '').replaceAll('\\|', '')).not.toContain('|');
      }),
    );
  });
});

describe('markdownTable', () => {
  it('sets the named columns right', () => {
    expect(markdownTable(['a', 'b'], [['x', '1']], [1])).toBe('| a | b |\n| --- | ---: |\n| x | 1 |');
  });
});
