import { isAlias, isMap, isScalar, isSeq, parse, parseDocument } from 'yaml';
import type { Document } from 'yaml';
import { UserError, showValue } from '../errors.js';
import type { KeyPath } from './document.js';
import { dotted } from './problems.js';

const PLAIN_WORD = /^[\p{L}][\p{L}\p{N}_-]*$/u;

/**
 * The study file `text` with the value at `path` replaced or added; comments stay, and when one value replaces another nothing else moves.
 * `path` is dotted, list positions from 1 (`hazard.levels.1.title`), or an array with positions from 0. The result is not checked.
 * @throws UserError when the text is not YAML or the path leads through a value.
 */
export function setAtPath(text: string, path: string | KeyPath, value: unknown): string {
  const doc = parseDocument(text, { stringKeys: true, prettyErrors: false });
  const [error] = doc.errors;
  if (error !== undefined) throw new UserError(`not valid YAML: ${error.message}`);
  const steps = typeof path === 'string' ? resolveDotted(doc, path) : path;
  if (steps.length === 0 || steps.includes('')) throw new UserError(`expected a key, got ${showValue(path)}`);
  const old: unknown = doc.getIn(steps, true);
  const scalar = scalarText(value);
  if (scalar !== undefined && isScalar(old) && old.range && old.source !== '' && !old.type?.startsWith('BLOCK_')) {
    // Cut in rather than print anew, so that the author's layout stays to the letter.
    return text.slice(0, old.range[0]) + scalar + text.slice(old.range[1]);
  }
  try {
    doc.setIn(steps, doc.createNode(value));
  } catch (cause) {
    throw new UserError(`${dotted(steps)} leads through a value that holds no keys`, { key: dotted(steps) }, { cause });
  }
  return doc.toString({ lineWidth: 0 });
}

/** The value that `text` stands for in a study file: `0.4` a number, `[a, b]` a list, anything else text. @throws UserError when it is not YAML. */
export function valueFromText(text: string): unknown {
  try {
    return parse(text, { stringKeys: true }) as unknown;
  } catch (cause) {
    throw new UserError(`not a value: ${showValue(text)}; put text with special characters in quotes`, {}, { cause });
  }
}

function resolveDotted(doc: Document, path: string): (string | number)[] {
  const steps: (string | number)[] = [];
  for (const step of path.split('.')) {
    let node: unknown = steps.length === 0 ? doc.contents : doc.getIn(steps, true);
    if (isAlias(node)) node = node.resolve(doc);
    if (!isSeq(node)) {
      steps.push(step);
      continue;
    }
    if (!/^[1-9]\d*$/.test(step) || Number(step) > node.items.length + 1) {
      const where = dotted(steps);
      throw new UserError(
        `${where} is a list of ${node.items.length}: expected a position from 1, got ${showValue(step)}`,
        { key: where },
      );
    }
    steps.push(Number(step) - 1);
  }
  if (doc.contents !== null && !isMap(doc.contents)) throw new UserError('a study is keys and values (title: …)');
  return steps;
}

/** How a simple value is written wherever it stands, or undefined for lists and mappings. */
function scalarText(value: unknown): string | undefined {
  if (typeof value === 'number' || typeof value === 'boolean' || value === null) return showYaml(value);
  if (typeof value !== 'string') return undefined;
  return PLAIN_WORD.test(value) && parse(value) === value ? value : JSON.stringify(value);
}

function showYaml(value: number | boolean | null): string {
  if (Object.is(value, -0)) return '-0.0';
  if (value === Infinity) return '.inf';
  if (value === -Infinity) return '-.inf';
  return Number.isNaN(value) ? '.nan' : String(value);
}
