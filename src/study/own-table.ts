/** `code_history` of family own-table: the study's own eras, as rows in the study or in a file beside it. */
import type { z } from 'zod';
import { SYSTEMS } from '../engineering/building.js';
import { MOST_OWN_ERAS } from '../engineering/capacity/own-table.js';
import type { System } from '../engineering/building.js';
import { list, number, strict, text, whole, word } from './fields.js';
import type { Finding } from './problems.js';

export const OWN_COEFFICIENT = { above: 0, to: 1.5 } as const;
export const OWN_YEAR = { from: 1800, to: 2100 } as const;
export const OWN_REDUCTION = { from: 1, to: 15 } as const;
export const OWN_LEVELS = ['working', 'strength'] as const;
export const OWN_PERIOD_RANGES = {
  coefficient: { above: 0, to: 2 },
  exponent: { above: 0, to: 2 },
  corner_s: { above: 0, to: 10 },
  fall: { from: 0, to: 3 },
} as const;

const bySystem = Object.fromEntries(
  SYSTEMS.map((system) => [system, number(OWN_COEFFICIENT).exactOptional().describe(`V/W asked of ${system}.`)]),
) as Record<System, z.ZodExactOptional<z.ZodNumber>>;

const OwnEraSchema = strict({
  from_year: whole({ ...OWN_YEAR, what: 'a year' }).describe('Year of the edition; adoption_lag_years is added to it.'),
  level: word(OWN_LEVELS).describe('Level of the coefficient: working stress (times 1.4) or strength.'),
  coefficient: number(OWN_COEFFICIENT)
    .exactOptional()
    .describe('V/W asked of every system that by_system does not list; without it those count as not designed.'),
  by_system: strict(bySystem).exactOptional().describe('V/W by lateral system.'),
  reduction: number(OWN_REDUCTION)
    .exactOptional()
    .describe("The edition's own reduction of the elastic force (R, q); overstrength and ductility never exceed it."),
  period: strict({
    coefficient: number(OWN_PERIOD_RANGES.coefficient).describe('c of T = c h^x, h in m.'),
    exponent: number(OWN_PERIOD_RANGES.exponent).describe('x of T = c h^x.'),
    corner_s: number({ ...OWN_PERIOD_RANGES.corner_s, unit: 's' }).describe(
      'Up to this period the coefficient is level, s.',
    ),
    fall: number(OWN_PERIOD_RANGES.fall).describe('Beyond the corner it falls with (corner/T) to this power.'),
  })
    .exactOptional()
    .describe("The edition's own design period and how the coefficient falls with it; left out: it does not."),
  source: text().exactOptional().describe('Where the row comes from; printed in hand calculations.'),
});

export const ownTableFields = {
  table: list(OwnEraSchema, `a list of 1 to ${String(MOST_OWN_ERAS)} rows`, 1, MOST_OWN_ERAS)
    .exactOptional()
    .describe('Rows of the table, by rising year.'),
  table_file: text('the path of a file')
    .exactOptional()
    .describe('The same as a table of comma-separated values, relative to this file (docs/code-histories.md).'),
};

/** What the rows say about each other, of the raw value of `code_history`. */
export function checkOwnTable(history: unknown): Finding[] {
  if (!isMapping(history) || history['family'] !== 'own-table') return [];
  const path = ['code_history'];
  const { table, table_file: file } = history;
  if (table === undefined && file === undefined)
    return [{ path, message: 'own-table needs its rows: give table, or table_file' }];
  if (table !== undefined && file !== undefined)
    return [{ path: [...path, 'table_file'], message: 'table has the rows already; keep one of the two' }];
  if (!Array.isArray(table)) return [];
  const findings: Finding[] = [];
  let before = -Infinity;
  table.forEach((row: unknown, i) => {
    if (!isMapping(row)) return;
    const year = row['from_year'];
    if (typeof year === 'number') {
      if (year <= before)
        findings.push({
          path: [...path, 'table', i, 'from_year'],
          message: `expected a year after ${String(before)}, that of the row above, got ${String(year)}`,
        });
      before = Math.max(before, year);
    }
    if (row['coefficient'] === undefined && row['by_system'] === undefined)
      findings.push({ path: [...path, 'table', i], message: 'expected a coefficient, or by_system' });
  });
  return findings;
}

function isMapping(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
