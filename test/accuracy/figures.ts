/** What the accuracy page states: errors of the reference cases per method and source, and what no outside case guards. */
import { applyAny } from '../../src/engineering/formula.js';
import type { AnyRecord } from '../../src/engineering/formula.js';
import { METHODS } from '../../src/engineering/methods.js';
import { openDatabase } from '../../src/store/database.js';
import { REFERENCE_CASES } from '../reference/cases.js';
import type { ReferenceCase } from '../reference/case.js';
import { caseInputs, measure } from '../support/engineering-measure.js';

/** How the answer was come by; only the last is a number we worked out ourselves. */
export type Kind = 'printed' | 'restated' | 'memory' | 'own arithmetic';

export interface ErrorRow {
  readonly method: string;
  readonly kind: Kind;
  readonly n: number;
  /** Of the relative error. */
  readonly mean: number;
  readonly p90: number;
  readonly max: number;
  /** Sources of the cases, each once. */
  readonly sources: readonly string[];
}

export interface TotalRow {
  readonly kind: Kind;
  readonly n: number;
  readonly methods: number;
  readonly mean: number;
  readonly p90: number;
  readonly max: number;
  readonly within: number;
}

export interface Unguarded {
  readonly method: string;
  readonly verified: string;
  /** Constants whose change by 1 % no outside case notices. */
  readonly constants: readonly string[];
  readonly why: 'no case from outside' | 'the printed digits are too few';
}

export interface Accuracy {
  readonly totals: readonly TotalRow[];
  readonly rows: readonly ErrorRow[];
  /** Constants changed, and of them guarded. */
  readonly constants: number;
  readonly guarded: number;
  readonly unguarded: readonly Unguarded[];
}

const MEASURED = REFERENCE_CASES.map((reference) => ({ reference, measured: measure(reference) }));

/** Errors per method and kind, and over all; DuckDB does the statistics. */
export async function accuracy(): Promise<Accuracy> {
  const db = await openDatabase({ path: ':memory:' });
  try {
    await db.run('CREATE TABLE c (method VARCHAR, kind VARCHAR, source VARCHAR, relative DOUBLE, within BOOLEAN)');
    for (const { reference, measured } of MEASURED) {
      await db.run('INSERT INTO c VALUES (?, ?, ?, ?, ?)', [
        reference.method,
        reference.mark,
        reference.source,
        measured.relative,
        measured.ok,
      ]);
    }
    const figures = 'count(*) AS n, avg(relative) AS mean, quantile_cont(relative, 0.9) AS p90, max(relative) AS max';
    const totals = await db.rows<TotalRow>(
      `SELECT kind, ${figures}, count(DISTINCT method) AS methods, count(*) FILTER (within) AS within
       FROM c GROUP BY kind ORDER BY list_position(['printed', 'restated', 'memory', 'own arithmetic'], kind)`,
    );
    const rows = await db.rows<Omit<ErrorRow, 'sources'>>(
      `SELECT method, kind, ${figures} FROM c GROUP BY method, kind
       ORDER BY method, list_position(['printed', 'restated', 'memory', 'own arithmetic'], kind)`,
    );
    return { totals, rows: rows.map((row) => ({ ...row, sources: sourcesOf(row) })), ...guards() };
  } finally {
    db.close();
  }
}

function sourcesOf({ method, kind }: { readonly method: string; readonly kind: Kind }): readonly string[] {
  const sources = REFERENCE_CASES.filter((one) => one.method === method && one.mark === kind).map(
    ({ source }) => source,
  );
  return [...new Set(sources)];
}

/** Every number of every record changed by 1 %, alone; a guard is a case whose answer we did not compute ourselves and that fails then. */
export function guards(): Pick<Accuracy, 'constants' | 'guarded' | 'unguarded'> {
  const unguarded: Unguarded[] = [];
  let constants = 0;
  let guarded = 0;
  for (const record of METHODS) {
    const outside = REFERENCE_CASES.filter(({ method, mark }) => method === record.id && mark !== 'own arithmetic');
    const numbers = Object.entries(record.constants as Readonly<Record<string, unknown>>).filter(
      (entry): entry is [string, number] => typeof entry[1] === 'number' && entry[1] !== 0,
    );
    const free = numbers.filter(([name, value]) => !outside.some((one) => fails(changed(record, name, value), one)));
    constants += numbers.length;
    guarded += numbers.length - free.length;
    if (free.length > 0) {
      unguarded.push({
        method: record.id,
        verified: record.verified,
        constants: free.map(([name]) => name),
        why: outside.length === 0 ? 'no case from outside' : 'the printed digits are too few',
      });
    }
  }
  return { constants, guarded, unguarded };
}

function changed(record: AnyRecord, name: string, value: number): AnyRecord {
  return { ...record, constants: { ...(record.constants as object), [name]: value * 1.01 } };
}

function fails(record: AnyRecord, reference: ReferenceCase): boolean {
  const { expected, tolerance } = reference;
  const value = applyAny(record, caseInputs(reference));
  return !(Math.abs(value - expected) <= tolerance * (1 + 1e-9) + 1e-15);
}
