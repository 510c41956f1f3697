/** A study's YAML: its plain value, what is wrong with it as YAML, and where each key stands. The only reader of the yaml library besides edit.ts. */
import { LineCounter, isAlias, isMap, isScalar, isSeq, parseDocument, visit } from 'yaml';
import type { Document, Node, YAMLError } from 'yaml';
import { showValue } from '../errors.js';

/** Keys and list positions (from 0) from the root down. */
export type KeyPath = readonly (string | number)[];

export interface Position {
  readonly line: number;
  readonly column: number;
}

export interface StudyDocument {
  readonly value: unknown;
  readonly errors: readonly { readonly offset: number; readonly message: string }[];
  /** False when the errors leave nothing that could be checked further. */
  readonly usable: boolean;
  /** Character at which the value at `path` begins, or its key; for a key that is not there, the key of its parent. */
  readonly offsetOf: (path: KeyPath, which?: 'value' | 'key') => number;
  readonly positionAt: (offset: number) => Position;
}

/** Enough for a study that re-uses its spectra, far too few for a file built to exhaust memory. */
const MOST_ALIASES = 50;

const MESSAGES: Partial<Record<YAMLError['code'], string>> = {
  TAB_AS_INDENT: 'a tab cannot indent; use spaces',
  MULTIPLE_DOCS: 'a second document begins here; a study is one document: remove the line ---',
};

/** Reads `text` (without byte order mark) as YAML 1.2; never throws. */
export function readDocument(text: string): StudyDocument {
  const lines = new LineCounter();
  const positionAt = (offset: number): Position => {
    const { line, col } = lines.linePos(offset);
    return { line: Math.max(line, 1), column: Math.max(col, 1) };
  };
  const broken = (message: string, offset = 0): StudyDocument => {
    return { value: undefined, errors: [{ offset, message }], usable: false, offsetOf: () => 0, positionAt };
  };
  try {
    const doc = parseDocument(text, { lineCounter: lines, prettyErrors: false, uniqueKeys: true, stringKeys: true });
    // The library turns its own stack overflow into an error of the text.
    if (doc.errors.some(({ message }) => message.includes('call stack'))) return broken('nested too deeply to be read');
    const errors = [...doc.errors, ...doc.warnings].map((error) => ({
      offset: error.pos[0],
      message: messageOf(error, doc),
    }));
    if (doc.directives?.yaml.version === '1.1')
      errors.push({ offset: 0, message: 'YAML 1.1 is not read; remove the %YAML line' });
    const fatal = doc.errors.some(({ code }) => code !== 'DUPLICATE_KEY');
    if (!fatal && doc.contents === null) return broken('the file is empty; a study begins with title:');
    if (!fatal && !isMap(doc.contents)) {
      return broken(
        `a study is keys and values (title: …), got ${isSeq(doc.contents) ? 'a list' : showValue(doc.toJS())}`,
      );
    }
    const value: unknown = fatal ? undefined : doc.toJS({ maxAliasCount: MOST_ALIASES });
    return { value, errors, usable: !fatal, offsetOf: (path, which) => offsetOf(doc, path, which), positionAt };
  } catch (error) {
    if (error instanceof RangeError) return broken('nested too deeply to be read');
    // The library throws when aliases multiply out, and when one names an anchor that is not there.
    if (error instanceof ReferenceError) return broken(`aliases (*name) cannot be followed: ${error.message}`);
    throw error;
  }
}

function messageOf(error: YAMLError, doc: Document.Parsed): string {
  if (error.code !== 'DUPLICATE_KEY') return MESSAGES[error.code] ?? `not valid YAML: ${error.message}`;
  let key = 'this key';
  visit(doc, {
    Pair: (_, pair) => {
      if (!isScalar(pair.key) || startOf(pair.key) !== error.pos[0]) return undefined;
      key = `the key ${showValue(pair.key.value)}`;
      return visit.BREAK;
    },
  });
  return `${key} stands twice; keep one`;
}

function offsetOf(doc: Document.Parsed, path: KeyPath, which: 'value' | 'key' = 'value'): number {
  let node: unknown = doc.contents;
  let key = 0;
  for (const step of path) {
    if (isAlias(node)) node = node.resolve(doc);
    if (isMap(node)) {
      // A key that stands twice counts the last time, as it does in the value.
      const pair = node.items.findLast((item) => isScalar(item.key) && String(item.key.value) === String(step));
      if (pair === undefined) return key;
      key = startOf(pair.key) ?? key;
      node = pair.value;
    } else if (isSeq(node) && node.items[Number(step)] !== undefined) {
      node = node.items[Number(step)];
      key = startOf(node) ?? key;
    } else return key;
  }
  if (which === 'key' || (isScalar(node) && node.value === null && node.source === '')) return key;
  return startOf(node) ?? key;
}

function startOf(node: unknown): number | undefined {
  return (node as Node | null)?.range?.[0];
}
