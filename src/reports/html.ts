/** The audited doors between text and markup: everything else goes through Preact, which escapes. */
import { createHash } from 'node:crypto';
import { h } from 'preact';
import type { ComponentChild } from 'preact';

/** JSON that can stand inside a script element: no `<`, no line separators that end a JavaScript string. */
export function scriptJson(value: unknown): string {
  return JSON.stringify(value).replaceAll('<', '\\u003c').replaceAll('\u2028', '\\u2028').replaceAll('\u2029', '\\u2029');
}

/** The source expression of a content security policy for an inline script or style of exactly this text. */
export function policyHash(text: string): string {
  return `'sha256-${createHash('sha256').update(text, 'utf8').digest('base64')}'`;
}

/** A data block for the page's script. */
export function DataBlock({ id, json }: { readonly id: string; readonly json: string }): ComponentChild {
  if (json.includes('<')) throw new Error(`data block ${id}: a "<" was left unescaped`);
  return h('script', { id, type: 'application/json', dangerouslySetInnerHTML: { __html: json } });
}

/** An inline script or style of ours. @throws Error when the text would end its own element. */
export function InlineText({ tag, text }: { readonly tag: 'script' | 'style'; readonly text: string }): ComponentChild {
  if (/<\/(?:script|style)|<!--/i.test(text)) throw new Error(`inline ${tag}: the text would end its element`);
  return h(tag, { dangerouslySetInnerHTML: { __html: text } });
}
