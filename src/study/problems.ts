/** Turns what the schema found into messages at the places of the file. */
import type { z } from 'zod';
import type { KeyPath } from './document.js';

/** A complaint about one key, before it has a place. */
export interface Finding {
  readonly path: KeyPath;
  readonly message: string;
  /** The key itself is wrong, not its value. */
  readonly atKey?: boolean;
}

type Issue = z.core.$ZodIssue;

/** The findings behind the schema's `issues`, one per key to mend. */
export function findingsOf(issues: readonly Issue[], above: KeyPath = []): Finding[] {
  return issues.flatMap((issue) => {
    const path = [...above, ...issue.path.map((step) => (typeof step === 'number' ? step : String(step)))];
    switch (issue.code) {
      case 'unrecognized_keys': {
        // fields.ts writes one line for each key, in the same order.
        const messages = issue.message.split('\n');
        return issue.keys.map((key, i) => ({
          path: [...path, key],
          message: messages[i] ?? 'unknown key',
          atKey: true,
        }));
      }
      case 'invalid_key':
        return [{ path, message: issue.issues[0]?.message ?? issue.message, atKey: true }];
      case 'invalid_union': {
        const meant = branchMeant(issue.errors);
        return meant === undefined ? [{ path, message: issue.message }] : findingsOf(meant, path);
      }
      default:
        return [{ path, message: issue.message }];
    }
  });
}

/** The alternative that fits best among those that fail only further down; undefined when none gets that far. */
function branchMeant(branches: readonly (readonly Issue[])[]): readonly Issue[] | undefined {
  const inside = branches.filter((issues) =>
    issues.every(({ path, code }) => path.length > 0 || code === 'unrecognized_keys'),
  );
  return inside.filter((issues) => issues.length > 0).sort((a, b) => countOf(a) - countOf(b))[0];
}

function countOf(issues: readonly Issue[]): number {
  return issues.reduce((sum, issue) => sum + (issue.code === 'unrecognized_keys' ? issue.keys.length : 1), 0);
}

/** `path` as people write it: dotted, list positions counted from 1. */
export function dotted(path: KeyPath): string {
  return path.map((step) => (typeof step === 'number' ? step + 1 : step)).join('.');
}
