/** The review sheet: every formula step of a few buildings drawn by lot, with blank cells for an independent check. */
import { isRanked, assess } from '../engineering/assess/assess.js';
import { compileContext } from '../engineering/assess/context.js';
import { formatQuantity, shownUnit } from '../engineering/format.js';
import type { Display } from '../engineering/format.js';
import type { Inputs, InputValue } from '../engineering/formula.js';
import { handSteps, unitOfName } from '../engineering/hand.js';
import { hashText, philox } from '../engineering/numeric/philox.js';
import { Trace } from '../engineering/trace.js';
import { findUnit } from '../engineering/units.js';
import { UserError } from '../errors.js';
import { explainBuilding } from '../screening/explain.js';
import { foundBy } from '../screening/found-by.js';
import { readGrids } from '../screening/kept-grids.js';
import { readRun } from '../screening/page-data.js';
import type { Database } from '../store/database.js';
import { csvText } from './csv-text.js';

export interface ReviewSheet {
  /** Text of review.csv. */
  readonly csv: string;
  /** Ids of the buildings, in rank order. */
  readonly buildings: readonly string[];
  /** How they were drawn, in words. */
  readonly drawn: string;
  readonly steps: number;
}

const HEAD = [
  'building',
  'name',
  'rank',
  'step',
  'under',
  'method',
  'title',
  'clause',
  'verified',
  'formula',
  'inputs',
  'independent value',
  'unit',
  'difference',
  'checked by',
  'date',
  'sample',
  'value of the program',
] as const;

// Marks the draws of this sheet among others made with the study's seed.
const STREAM = 0x52455657;

/**
 * A sheet for `size` ranked buildings of a run, drawn without replacement with the study's seed: the same run and size give the same buildings.
 * @throws UserError when the run ranks no building.
 */
export async function reviewSheet(
  db: Database,
  runId: number,
  size: number,
  display: Display = 'si',
): Promise<ReviewSheet> {
  const run = await readRun(db, runId);
  const seed = Number(await db.value('SELECT seed FROM run WHERE run_id = ?', [runId]));
  const ranked = await db.rows<{ id: string; name: string | null; rank: number }>(
    `SELECT b.id, b.name, r."rank" FROM result r JOIN building b ON b.inventory_id = ? AND b.building_index = r.building_index
     WHERE r.run_id = ? AND r."rank" IS NOT NULL ORDER BY r."rank"`,
    [run.inventory_id, runId],
  );
  if (ranked.length === 0) throw new UserError(`run ${String(runId)} ranks no building: there is nothing to review`);
  const chosen = drawSample(ranked, size, seed);
  const drawn = `${String(chosen.length)} of the ${String(ranked.length)} ranked buildings of run ${String(runId)}, drawn without replacement with seed ${String(seed)}; each had the same chance`;

  const context = compileContext(run.settings, await readGrids(db, run.settings));
  const found = await foundBy(
    db,
    run.inventory_id,
    chosen.map((one) => one.id),
  );
  const rows: (string | number | null)[][] = [];
  for (const { id, name, rank } of chosen) {
    // Explaining first proves that the value recomputed here is the stored one.
    const { building } = await explainBuilding(db, runId, id, display);
    const trace = new Trace(found[id]);
    if (!isRanked(assess(building, context, trace))) continue;
    rows.push(...stepRows(trace, drawn, display).map((cells, step) => [id, name, rank, step + 1, ...cells]));
  }
  return { csv: csvText(HEAD, rows), buildings: chosen.map(({ id }) => id), drawn, steps: rows.length };
}

/** `size` of `list` by lot, in the order of the list; each entry's lot hangs on its id and the seed alone. */
export function drawSample<T extends { readonly id: string }>(
  list: readonly T[],
  size: number,
  seed: number,
): readonly T[] {
  const words = new Uint32Array(4);
  const lots = list.map((entry, at) => {
    philox(hashText(entry.id), entry.id.length, 0, STREAM, seed, 0, words);
    return { entry, at, high: words[0] ?? 0, low: words[1] ?? 0 };
  });
  return lots
    .sort((a, b) => a.high - b.high || a.low - b.low || a.at - b.at)
    .slice(0, size)
    .sort((a, b) => a.at - b.at)
    .map(({ entry }) => entry);
}

function stepRows(trace: Trace, drawn: string, display: Display): (string | number | null)[][] {
  const shown = handSteps(trace, display);
  let heading = '';
  return trace.steps.flatMap((step, i) => {
    if (step.kind === 'heading') heading = step.text;
    const words = shown[i];
    if (step.kind !== 'formula' || words === undefined) return [];
    const { record, inputs, value } = step;
    const unit = record.family.unit === null ? '' : (findUnit(record.family.unit)?.label ?? record.family.unit);
    const { id, title, verified } = record;
    return [
      [
        heading,
        id,
        title,
        words.source,
        verified,
        words.symbolic,
        showInputs(inputs, record.constants as Inputs, display),
        '',
        unit,
        '',
        '',
        '',
        drawn,
        value,
      ],
    ];
  });
}

/**
 * Inputs and constants to full precision and in the units of the formula, so that a check by hand starts from the very same numbers;
 * a quantity shown in another unit follows in brackets.
 */
function showInputs(inputs: Inputs, constants: Inputs, display: Display): string {
  const show = ([name, value]: [string, InputValue]): string => {
    const unit = unitOfName(name);
    const text = typeof value === 'object' ? value.join(' / ') : String(value);
    const other =
      typeof value === 'number' && unit !== null && shownUnit(unit, display) !== unit
        ? ` (${formatQuantity(value, unit, display, 4)})`
        : '';
    return `${name} = ${text}${unit === null ? '' : ` ${findUnit(unit)?.label ?? unit}`}${other}`;
  };
  return [...Object.entries(inputs), ...Object.entries(constants)].map(show).join('; ');
}
