/** A page that stands alone: one file, nothing fetched, only the inline style and script whose hashes it names. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import { renderToString } from 'preact-render-to-string';
import { DataBlock, InlineText, policyHash } from './html.js';

export interface PageParts {
  readonly title: string;
  readonly style: string;
  readonly script: string;
  readonly body: ComponentChild;
  /** Data blocks by element id, as JSON already safe for a script element. */
  readonly blocks: Readonly<Record<string, string>>;
}

/** The whole document as text. */
export function renderPage({ title, style, script, body, blocks }: PageParts): string {
  const policy = [
    "default-src 'none'",
    `script-src ${policyHash(script)}`,
    `style-src ${policyHash(style)}`,
    'img-src data:',
    "base-uri 'none'",
    "form-action 'none'",
  ].join('; ');
  const document = h(
    'html',
    { lang: 'en' },
    h(
      'head',
      null,
      h('meta', { charSet: 'utf-8' }),
      h('meta', { 'http-equiv': 'Content-Security-Policy', content: policy }),
      h('meta', { name: 'viewport', content: 'width=device-width, initial-scale=1' }),
      h('meta', { name: 'color-scheme', content: 'light dark' }),
      h('title', null, title),
      h(InlineText, { tag: 'style', text: style }),
    ),
    h(
      'body',
      null,
      body,
      Object.entries(blocks).map(([id, json]) => h(DataBlock, { id, json })),
      h(InlineText, { tag: 'script', text: script }),
    ),
  );
  return `<!doctype html>\n${renderToString(document)}\n`;
}
