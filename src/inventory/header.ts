import { findColumn } from '../engineering/columns.js';
import type { InventoryColumn } from '../engineering/columns.js';
import { findUnit, unitsOf } from '../engineering/units.js';
import type { Unit } from '../engineering/units.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { nearest } from '../study/nearest.js';
import type { IntakeStudy } from './intake-study.js';
import { foldWord } from './cell.js';

/** One of our columns and where it stands in the file. */
export interface MappedColumn {
  readonly column: InventoryColumn;
  /** Their header name. */
  readonly theirs: string;
  /** Position in the file, from 0. */
  readonly position: number;
  /** The unit of cells that name none. */
  readonly unit?: Unit | undefined;
  readonly stored?: Unit | undefined;
}

export interface Mapping {
  readonly header: readonly string[];
  readonly columns: readonly MappedColumn[];
  /** Position of the column whose value says which rows belong together. */
  readonly mergeBy: number | undefined;
  readonly noBuilding: { readonly position: number; readonly values: readonly string[] } | undefined;
}

/**
 * Finds every mapped column in the header.
 * @throws UserError naming all problems at once: a name the header lacks or has twice, an unknown column or unit.
 */
export function mapHeader(header: readonly string[], study: IntakeStudy['inventory']): Mapping {
  const problems: Problem[] = [];
  const find = (theirs: string, key: string): number => {
    const found = locate(header, theirs);
    if (typeof found === 'number') return found;
    problems.push({ place: { file: study.file, key }, message: found });
    return -1;
  };
  const columns: MappedColumn[] = [];
  for (const [ours, choice] of Object.entries(study.columns)) {
    if (choice === undefined) continue;
    const key = `inventory.columns.${ours}`;
    const column = findColumn(ours);
    if (column === undefined) {
      problems.push({ place: { key }, message: 'swaymark has no such column' });
      continue;
    }
    const { column: theirs, unit } = typeof choice === 'string' ? { column: choice, unit: undefined } : choice;
    const position = find(theirs, key);
    const stored = column.unit === undefined ? undefined : findUnit(column.unit);
    const read = unit === undefined ? stored : findUnit(unit);
    if (unit !== undefined && (read === undefined || read.dimension !== stored?.dimension)) {
      const allowed =
        stored === undefined
          ? 'this column has no unit'
          : `known: ${unitsOf(stored.dimension)
              .map(({ id }) => id)
              .join(', ')}`;
      problems.push({
        place: { key: `${key}.unit` },
        message: `${showValue(unit)} is not a unit of ${ours}; ${allowed}`,
      });
    }
    columns.push({ column, theirs, position, unit: read, stored });
  }
  if (study.columns['id'] === undefined) {
    problems.push({
      place: { key: 'inventory.columns.id' },
      message: 'is missing; map id to the column that names a building',
    });
  }
  const mergeBy = study.merge_rows_by === undefined ? undefined : find(study.merge_rows_by, 'inventory.merge_rows_by');
  const no = study.no_building;
  const noBuilding =
    no === undefined
      ? undefined
      : { position: find(no.column, 'inventory.no_building.column'), values: no.values.map(foldWord) };
  if (problems.length > 0) throw UserError.of(problems);
  return { header, columns, mergeBy, noBuilding };
}

function locate(header: readonly string[], theirs: string): number | string {
  const exact = positions(header, (name) => name === theirs.trim());
  const found = exact.length > 0 ? exact : positions(header, (name) => foldWord(name) === foldWord(theirs));
  if (found.length === 1) return found[0] ?? -1;
  if (found.length > 1) {
    return `the header has ${showValue(theirs)} ${found.length} times (columns ${found.map((at) => at + 1).join(', ')}); give each its own name in the file`;
  }
  const close = nearest(
    theirs,
    header.filter((name) => name !== ''),
  );
  const hint = close === undefined ? '' : `; did you mean ${showValue(close)}?`;
  const names = header.map((name, at) => (name === '' ? `(column ${at + 1} has no name)` : name)).join(', ');
  return `the header has no ${showValue(theirs)}${hint}; it has: ${names.length > 1500 ? `${names.slice(0, 1500)}…` : names}`;
}

function positions(header: readonly string[], fits: (name: string) => boolean): number[] {
  return header.flatMap((name, at) => (name !== '' && fits(name) ? [at] : []));
}

/** Positions of columns that must have these names. @throws UserError listing the header. */
export function mapNamed<N extends string>(
  header: readonly string[],
  names: readonly N[],
  file: string,
): Readonly<Record<N, number>> {
  const problems: Problem[] = [];
  const found = names.map((name) => {
    const position = locate(header, name);
    if (typeof position === 'number') return [name, position] as const;
    problems.push({ place: { file }, message: position });
    return [name, -1] as const;
  });
  if (problems.length > 0) throw UserError.of(problems);
  return Object.fromEntries(found) as Record<N, number>;
}
