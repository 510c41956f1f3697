/** The table of neighbours: pairs of buildings with the gap between them. */
import type { Database } from '../store/database.js';
import { readNumberCell } from './cell.js';
import { mapNamed } from './header.js';
import { normalise } from './normalise.js';
import { readTableSql } from './read.js';
import { inspectSource } from './source.js';
import type { Source } from './source.js';

const NAMES = ['id_a', 'id_b', 'gap_m', 'floors_aligned'] as const;
const LEFT_OUT = 'the pair is left out';
const GAP = { name: 'gap_m', kind: 'number', title: 'Gap', limits: [0, 1000] } as const;

/** What rows of one and the same pair disagree on, and what the pair then counts with: the side on which they strike sooner [judgement]. */
const DISAGREEMENTS = [
  {
    of: 'gap_m',
    code: 'gaps-disagree',
    told: "CAST(gap_m AS VARCHAR) || ' m'",
    action: 'the smaller gap is taken',
  },
  {
    of: 'floors_aligned',
    code: 'floors-disagree',
    told: 'floors_aligned',
    action: 'the floors are taken not to be at one level',
  },
] as const;

/** Opens the table, so that its bytes can enter the fingerprint of the inventory. */
export function inspectNeighbours(path: string): Source {
  return inspectSource(path, 'auto');
}

/**
 * Reads the pairs into the table `neighbour`, every row of them; an id that is no building, an unreadable gap, and rows of one pair, in
 * either order of its ids, that disagree are findings. A blank contradicts nothing.
 */
export async function takeInNeighbours(db: Database, source: Source, inventoryId: string): Promise<number> {
  const table = normalise(source, 'auto');
  try {
    const positions = mapNamed(table.header, NAMES, source.path);
    const cell = (name: (typeof NAMES)[number]): string => `nullif(trim(c${positions[name]}), '')`;
    const cells = await db.columns(
      `SELECT "row", ${NAMES.map((name) => `${cell(name)} AS ${name}`).join(', ')} FROM ${readTableSql(table)} ORDER BY "row"`,
      { row: 'i32', id_a: 'text', id_b: 'text', gap_m: 'text', floors_aligned: 'text' },
    );
    const gaps = new Float64Array(cells.rowCount).fill(NaN);
    const problems: { row: number; column: string; value: string | null; code: string; message: string }[] = [];
    const aligned = cells.floors_aligned.map((text, at) => {
      const word = text?.toLowerCase() ?? '';
      if (['yes', 'y', 'true', '1'].includes(word)) return 'yes';
      if (['no', 'n', 'false', '0'].includes(word)) return 'no';
      if (word !== '')
        problems.push({
          row: cells.row[at] ?? 0,
          column: 'floors_aligned',
          value: text,
          code: 'unknown-word',
          message: 'neither yes nor no',
        });
      return null;
    });
    cells.gap_m.forEach((text, at) => {
      if (text === null) return;
      const read = readNumberCell(text.replace(/\s*m$/, ''), GAP, { decimal: '.' });
      gaps[at] = /^0+(\.0+)?$/.test(text) ? 0 : read.value;
      if (Number.isNaN(gaps[at]))
        problems.push({
          row: cells.row[at] ?? 0,
          column: 'gap_m',
          value: text,
          code: read.note?.code ?? 'not-a-number',
          message: read.note?.message ?? 'not a gap in m',
        });
    });
    await db.run(
      'CREATE OR REPLACE TEMP TABLE intake_pair ("row" INTEGER, id_a VARCHAR, id_b VARCHAR, gap_m DOUBLE, floors_aligned VARCHAR)',
    );
    await db.append('intake_pair', [cells.row, cells.id_a, cells.id_b, gaps, aligned]);
    if (problems.length > 0) {
      const nulls = problems.map(() => null);
      await db.append('intake_finding', [
        Int32Array.from(problems, ({ row }) => row),
        nulls,
        problems.map(({ column }) => `neighbours ${column}`),
        problems.map(({ value }) => value),
        problems.map(({ code }) => code),
        problems.map(({ message }) => message),
        problems.map(() => 'treated as unknown'),
        problems.map(() => 'note'),
      ]);
    }
    const exists = (name: string): string => `${name} IN (SELECT id FROM intake_building)`;
    const good = `${exists('id_a')} AND ${exists('id_b')} AND id_a <> id_b`;
    await db.run(
      `INSERT INTO intake_finding SELECT "row", NULL, 'neighbours', concat_ws(' and ', id_a, id_b), 'unknown-neighbour',
         'both must be ids of two buildings of the inventory', ?, 'note' FROM intake_pair WHERE (${good}) IS NOT TRUE`,
      [LEFT_OUT],
    );
    await noteDisagreements(db, good);
    return await db.run(
      `INSERT INTO neighbour SELECT ?, id_a, id_b, gap_m, floors_aligned FROM intake_pair WHERE ${good} ORDER BY id_a, id_b, "row"`,
      [inventoryId],
    );
  } finally {
    table.remove();
  }
}

/** One finding a pair and column, at the later of the rows that lie furthest apart. */
async function noteDisagreements(db: Database, good: string): Promise<void> {
  for (const { of, code, told, action } of DISAGREEMENTS)
    await db.run(
      `INSERT INTO intake_finding
       WITH pair AS (SELECT least(id_a, id_b) AS a, greatest(id_a, id_b) AS b, first("row" ORDER BY ${of}, "row") AS low,
           first("row" ORDER BY ${of} DESC, "row") AS high, first(${told} ORDER BY ${of}) AS one,
           first(${told} ORDER BY ${of} DESC) AS other, count(*) AS n
         FROM intake_pair WHERE ${good} AND ${of} IS NOT NULL GROUP BY 1, 2 HAVING count(DISTINCT ${of}) > 1)
       SELECT greatest(low, high), NULL, ?, one || ' and ' || other, ?, a || ' and ' || b || ': row ' || low || ' says ' || one || ', row ' ||
         high || ' says ' || other || CASE WHEN n > 2 THEN ', of ' || n || ' rows of this pair' ELSE '' END || '; keep the one that holds', ?, 'note'
       FROM pair`,
      [`neighbours ${of}`, code, action],
    );
}
