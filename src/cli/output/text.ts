/** Text for a terminal: made harmless, measured in columns, wrapped, cut. */

const SEGMENTER = new Intl.Segmenter('en', { granularity: 'grapheme' });
/** Scripts and forms that take two columns; half-width katakana and hangul take one. */
const WIDE =
  /^(?![\uff61-\uffdc])(?:\p{Script=Han}|\p{Script=Hiragana}|\p{Script=Katakana}|\p{Script=Hangul}|\p{Script=Bopomofo}|\p{Script=Yi}|\p{Emoji_Presentation}|[\u3000-\u303e\uff01-\uff60\uffe0-\uffe6])/u;
const WIDTHLESS = /^[\p{Mn}\p{Me}\p{Cf}]+$/u;

/** `text` in one line without control characters and those that reverse the reading order: data must not steer the terminal. */
export function clean(text: string): string {
  return text
    .replace(/[\t\r\n\u2028\u2029\u0085]+/gu, ' ')
    .replace(/[\p{Cc}\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]/gu, '');
}

/** Columns that `text` takes on a terminal. */
export function width(text: string): number {
  // Plain ASCII needs no segmentation.
  if (/^[\x20-\x7e]*$/.test(text)) return text.length;
  let columns = 0;
  for (const { segment } of SEGMENTER.segment(text))
    columns += WIDTHLESS.test(segment) ? 0 : WIDE.test(segment) ? 2 : 1;
  return columns;
}

/** `text` cut to `columns`, with … in the last one when something was cut. */
export function fit(text: string, columns: number): string {
  if (width(text) <= columns) return text;
  let kept = '';
  let used = 0;
  for (const { segment } of SEGMENTER.segment(text)) {
    const more = width(segment);
    if (used + more > columns - 1) break;
    kept += segment;
    used += more;
  }
  return `${kept.trimEnd()}…`;
}

/** `text` filled with blanks to `columns`, on the left when `right` is set. */
export function pad(text: string, columns: number, right = false): string {
  const blanks = ' '.repeat(Math.max(0, columns - width(text)));
  return right ? blanks + text : text + blanks;
}

/** `text` in lines of at most `columns`, broken at blanks; the first begins with `first`, the others with `rest`. */
export function wrap(text: string, columns: number, first = '', rest = first): string[] {
  const lines: string[] = [];
  let line = first;
  let empty = true;
  for (const word of text.split(/[ \n]+/).filter((part) => part !== '')) {
    if (!empty && width(line) + 1 + width(word) > columns) {
      lines.push(line);
      line = rest + word;
      continue;
    }
    line += empty ? word : ` ${word}`;
    empty = false;
  }
  return [...lines, line];
}
