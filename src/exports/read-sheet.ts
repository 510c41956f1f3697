/** A sheet of answers that was filled in, read and checked row by row. */
import { findColumn } from '../engineering/columns.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { readAnswer } from '../inventory/answers.js';
import type { HeldAnswer } from '../inventory/kept-answers.js';
import type { Study } from '../study/schema.js';
import { recordsOf, writtenCell } from './sheet-cells.js';
import { dayWritten } from './sheet-date.js';
import { readHead } from './sheet-head.js';

/** What is written where the visit looked and could not find out. */
const NOT_FOUND = /^(?:\?|not found)$/i;
/** The same, unless the study has a meaning for it. */
const UNKNOWN = 'unknown';

/** One answer of a sheet, or one question that a visit found no answer to. */
export interface Given extends Pick<
  HeldAnswer,
  'id' | 'column' | 'cell' | 'visit' | 'surveyor' | 'surveyed_on' | 'remark'
> {
  readonly row: number;
}

export interface ReadSheet {
  readonly given: readonly Given[];
  /** Headings of columns that are none of ours. */
  readonly notRead: readonly string[];
}

/** Every answer of the sheet. @throws UserError with all that is wrong with it. */
export function readSheet(text: string, about: Omit<SheetRow, 'cellOf' | 'asked'>): ReadSheet {
  const { file, study } = about;
  const rows = recordsOf(text, file);
  const { asked, notRead, at } = readHead(rows, file);
  const problems: Problem[] = [];
  const given: Given[] = [];
  rows.slice(1).forEach((cells, i) => {
    const found = readRow(i + 2, { ...about, cellOf: (name) => cells[at(name)] ?? '', asked });
    given.push(...found.given);
    problems.push(...found.problems);
  });
  problems.push(...contradictions(given, file, study), ...undesigned(given, file, study));
  if (problems.length > 0) throw UserError.of(problems);
  if (given.length === 0)
    throw new UserError('the sheet answers nothing: every cell is blank or holds a dash', { file });
  return { given, notRead };
}

interface SheetRow {
  readonly cellOf: (name: string) => string;
  /** Columns of the sheet that answer something. */
  readonly asked: readonly string[];
  readonly file: string;
  readonly study: Study;
  /** Ids of the buildings of the newest run. */
  readonly known: ReadonlySet<string>;
  /** When the sheet is taken. */
  readonly taken: Date;
}

/** Where a day begins first, it is this much ahead of the clock of the program, which is UTC. */
const DAY_AHEAD_MS = 14 * 3_600_000;

/** Drawings that show no design for earthquakes, and a coefficient of such a design, in whichever rows of one building. */
function undesigned(given: readonly Given[], file: string, study: Study): readonly Problem[] {
  const designed = new Map<string, Given>();
  for (const one of given)
    if (one.column === 'design_base_shear_coefficient' && one.cell !== null && !designed.has(one.id))
      designed.set(one.id, one);
  return given.flatMap(({ row, id, column, cell }) => {
    const other = designed.get(id);
    if (column !== 'design_level' || cell === null || other === undefined) return [];
    if (readFound(column, cell, study) !== 'none') return [];
    return [
      {
        place: { file, row, columnName: column },
        message: `${showValue(cell)} says that the drawings show no design for earthquakes, but row ${String(other.row)} gives design_base_shear_coefficient ${showValue(other.cell)} for ${showValue(id)}; keep the one that holds: leave the coefficient blank, or write working or strength`,
      },
    ];
  });
}

/** Two rows that answer one question of a building differently: which of them holds is for whoever was there to say. */
function contradictions(given: readonly Given[], file: string, study: Study): readonly Problem[] {
  const first = new Map<string, Given>();
  return given.flatMap((one) => {
    const { row, id, column, cell } = one;
    if (cell === null) return [];
    const key = JSON.stringify([id, column]);
    const other = first.get(key);
    if (other?.cell == null) {
      first.set(key, one);
      return [];
    }
    if (readFound(column, cell, study) === readFound(column, other.cell, study)) return [];
    return [
      {
        place: { file, row, columnName: column },
        message: `${showValue(cell)} for ${showValue(id)}, of which row ${String(other.row)} says ${showValue(other.cell)}; keep the one that holds`,
      },
    ];
  });
}

function readRow(
  row: number,
  { cellOf, asked, file, study, known, taken }: SheetRow,
): { readonly given: readonly Given[]; readonly problems: readonly Problem[] } {
  const written = (name: string): string | null => writtenCell(cellOf(name));
  const about = (name: string): string | null => (written(name) === '?' ? null : written(name));
  const answered = asked.flatMap((column) => {
    const cell = written(column);
    return cell === null ? [] : [{ column, cell }];
  });
  if (answered.length === 0) return { given: [], problems: [] };
  const id = about('id');
  if (id === null)
    return {
      given: [],
      problems: [{ place: { file, row, columnName: 'id' }, message: 'an answer without the id of a building' }],
    };
  const visit = visitCalled(about('visit'), study);
  const rest = { surveyor: about('surveyor'), surveyed_on: about('surveyed_on'), remark: about('remark') };
  const given: Given[] = [];
  const problems: Problem[] = [];
  if (!known.has(id))
    problems.push({
      place: { file, row, columnName: 'id' },
      message: `${showValue(id)} is no building of the newest run`,
    });
  const kinds = Object.keys(study.survey.visits).join(', ');
  const named = about('visit');
  const day = rest.surveyed_on === null ? null : dayWritten(rest.surveyed_on);
  if (day !== null && day > taken.getTime() + DAY_AHEAD_MS)
    problems.push({
      place: { file, row, columnName: 'surveyed_on' },
      message: `${showValue(rest.surveyed_on)} is a day to come; the sheet is taken on ${taken.toISOString().slice(0, 10)}: write the day of the visit, or leave the cell blank`,
    });
  if (rest.surveyed_on !== null && day === null)
    problems.push({
      place: { file, row, columnName: 'surveyed_on' },
      message: `${showValue(rest.surveyed_on)} is no day of the calendar; write it like 2026-12-03, or leave the cell blank`,
    });
  const present = taken.getUTCFullYear();
  const latest = day === null ? present : Math.min(present, new Date(day).getUTCFullYear());
  for (const { column, cell } of answered) {
    const read = readFound(column, cell, study);
    if (typeof read === 'object' && read !== null) {
      problems.push({ place: { file, row, columnName: column }, message: read.wrong });
      continue;
    }
    if (column === 'year_built' && typeof read === 'number' && read > latest)
      problems.push({
        place: { file, row, columnName: column },
        message: `${showValue(cell)} lies after ${String(latest)}, when it was looked at; write the year in which it was built, or leave the cell blank`,
      });
    given.push({ row, id, column, cell: read === null ? null : cell, visit: visit ?? named, ...rest });
  }
  const missing = given.find((one) => one.cell === null);
  if (missing !== undefined && visit === undefined)
    problems.push({
      place: { file, row, columnName: 'visit' },
      message: `${missing.column} is ${showValue(written(missing.column))}, looked for and not found, and ${missing.visit === null ? 'no kind of visit is named' : `${showValue(missing.visit)} is no kind of visit of the study`}: name the one that looked (${kinds}), or leave cells blank where nobody looked`,
    });
  else if (named !== null && visit === undefined)
    problems.push({
      place: { file, row, columnName: 'visit' },
      message: `${showValue(named)} is no kind of visit of the study; write one of ${kinds}, or leave the cell blank`,
    });
  return { given, problems };
}

/** A cell as it will be read; null where it says that it could not be found out. */
function readFound(name: string, cell: string, study: Study): ReturnType<typeof readAnswer> | null {
  if (NOT_FOUND.test(cell.replace(/\s+/g, ' '))) return null;
  const column = findColumn(name);
  const read = column === undefined ? { wrong: 'no such column' } : readAnswer(column, cell, study);
  // a word for what is not known: it must not take the place of what the owner wrote
  return read === UNKNOWN || (typeof read === 'object' && cell.toLowerCase() === UNKNOWN) ? null : read;
}

/** The study's name of a kind of visit, whichever case it is written in. */
function visitCalled(written: string | null, { survey }: Study): string | undefined {
  const names = Object.keys(survey.visits);
  return names.find((name) => name === written) ?? names.find((name) => name.toLowerCase() === written?.toLowerCase());
}
