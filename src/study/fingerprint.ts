import { createHash } from 'node:crypto';
import type { Study } from './schema.js';

/** `value` as JSON with the keys of every mapping sorted, so that equal values are equal texts; lists keep their order. */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) => {
    if (typeof inner !== 'object' || inner === null || Array.isArray(inner)) return inner;
    // Entries of a null-prototype object, so that no key is special; compared by code units, never by locale.
    const sorted = Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
    const plain = Object.create(null) as Record<string, unknown>;
    for (const [key, item] of sorted) plain[key] = item;
    return plain;
  });
}

/**
 * First 16 hexadecimal digits of the SHA-256 of a study with its defaults filled in: the same whatever the order of keys, comments, layout, the folder
 * of the reports, the budget and the visits of a survey, which no ranking depends on.
 */
export function studyFingerprint({ output: _output, budget: _budget, survey: _survey, ...study }: Study): string {
  return createHash('sha256').update(canonicalJson(study), 'utf8').digest('hex').slice(0, 16);
}
