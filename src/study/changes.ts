/** What differs between two studies, key by key. */
import type { KeyPath } from './document.js';

export interface StudyChange {
  readonly path: KeyPath;
  /** Values before and after; undefined where the key is not there. */
  readonly from: unknown;
  readonly to: unknown;
}

/** The smallest parts that differ between two plain values, in the order of their keys; a list of another length is one part. */
export function changesBetween(from: unknown, to: unknown, path: KeyPath = []): readonly StudyChange[] {
  if (Array.isArray(from) && Array.isArray(to) && from.length === to.length)
    return from.flatMap((value, i) => changesBetween(value, to[i], [...path, i]));
  if (isMapping(from) && isMapping(to)) {
    const names = new Set([...Object.keys(from), ...Object.keys(to)]);
    return [...names].flatMap((name) => changesBetween(from[name], to[name], [...path, name]));
  }
  if (isMapping(from) || isMapping(to) || Array.isArray(from) || Array.isArray(to))
    return JSON.stringify(from) === JSON.stringify(to) ? [] : [{ path, from, to }];
  return Object.is(from, to) ? [] : [{ path, from, to }];
}

function isMapping(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
