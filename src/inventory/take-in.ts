/** The whole intake: from a file to the tables `inventory`, `building`, `finding`, `row_account`, `year_pool` and `neighbour`. */
import { isAbsolute, join } from 'node:path';
import { Bug, UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { canonicalJson } from '../study/fingerprint.js';
import { readAccount, storeAccount } from './account.js';
import type { RowAccount } from './account.js';
import { answersFingerprint, layAnswers } from './answers.js';
import type { Answer } from './answers.js';
import { countAttributes } from './attributes.js';
import type { Attributes } from './attributes.js';
import { makeBuildings } from './buildings.js';
import { readOddCells } from './cells.js';
import { CHECKS } from './checks.js';
import { findContradictions, noteUndesigned } from './contradictions.js';
import { decideFates } from './fates.js';
import { BuildingNotes, noteColumn, startFindings, storeFindings } from './findings.js';
import { mapHeader } from './header.js';
import type { Mapping } from './header.js';
import { inferSizes } from './infer.js';
import type { IntakeStudy } from './intake-study.js';
import { currentAnswers } from './kept-answers.js';
import { inspectNeighbours, takeInNeighbours } from './neighbours.js';
import { noteListLengths } from './list-lengths.js';
import { notePartOf } from './part-of.js';
import { readPlans } from './plans.js';
import { makeYearPools, storeYearPools } from './pools.js';
import { readCells } from './read.js';
import { readSizes } from './sizes.js';
import { inspectSource } from './source.js';
import type { Source } from './source.js';
import { storeBuildings } from './store-buildings.js';
import { openTable } from './table.js';
import type { Table } from './table.js';
import { presentYear, refusedYears, until } from './years-to-come.js';

/** Goes into the fingerprint: an intake that reads differently is another inventory. */
const INTAKE_VERSION = 8;

export interface TakenIn {
  readonly inventoryId: string;
  readonly rowsIn: number;
  readonly buildings: number;
  readonly account: RowAccount;
  readonly attributes: Attributes;
  readonly findings: Readonly<Record<'rejected-row' | 'rejected-cell' | 'note', number>>;
  /** True when this inventory was already in the database and nothing was done. */
  readonly known: boolean;
}

export type IntakeStep = 'opening' | 'reading' | 'casting' | 'checking' | 'storing';

export interface TakeInOptions {
  /** The answers of surveys laid over it; those that the database keeps when left out. */
  readonly answers?: readonly Answer[];
  /** When it is taken in: years after it are refused. None is when left out. */
  readonly made?: Date;
}

/**
 * Takes an inventory into the database, inside the caller's transaction, which `begin` begins where it has not yet; paths are
 * relative to `folder`.
 * @throws UserError when the file, its header or the mapping is at fault, or no row is a building.
 */
export async function takeIn(
  db: Database,
  study: IntakeStudy,
  folder: string,
  progress: (step: IntakeStep) => void = () => undefined,
  begin: () => Promise<void> = () => Promise.resolve(),
  { answers: found, made }: TakeInOptions = {},
): Promise<TakenIn> {
  progress('opening');
  const path = at(folder, study.inventory.file);
  const source = inspectSource(path, study.inventory.encoding);
  const pairs = study.neighbours === undefined ? undefined : inspectNeighbours(at(folder, study.neighbours.file));
  const answers = found ?? (await currentAnswers(db));
  const year = made === undefined ? Infinity : presentYear(made);
  const inventoryId = fingerprint(source, pairs, study, answers);
  // an inventory with years to come is another one when they have come
  const datedId = fingerprint(source, pairs, study, answers, year);
  for (const id of [inventoryId, datedId])
    if ((await db.value('SELECT count(*) FROM inventory WHERE inventory_id = ?', [id])) === 1) return readTaken(db, id);

  progress('reading');
  const table = openTable(db, source, study.inventory.delimiter);
  try {
    const mapping = until(year, mapHeader(table.header, { ...study.inventory, file: path }));
    return await takeTable(
      db,
      study,
      { source, pairs, table, mapping, inventoryId, datedId, answers },
      progress,
      begin,
    );
  } finally {
    table.remove();
    await dropScratch(db);
  }
}

interface Parts {
  readonly source: Source;
  readonly pairs: Source | undefined;
  readonly table: Table;
  readonly mapping: Mapping;
  readonly inventoryId: string;
  /** Where years are refused because they are to come. */
  readonly datedId: string;
  readonly answers: readonly Answer[];
}

async function takeTable(
  db: Database,
  study: IntakeStudy,
  parts: Parts,
  progress: (step: IntakeStep) => void,
  begin: () => Promise<void>,
): Promise<TakenIn> {
  const { source, pairs, table, answers } = parts;
  if (table.written + table.rejects.length === 0) {
    const message = `the table has a header (${table.header.length} columns) and no rows; add a row for each building below it`;
    throw new UserError(message, { file: source.path });
  }
  await startFindings(db);
  await readCells(db, table, parts.mapping, study.inventory);
  const mapping = await layAnswers(db, parts.mapping, study, answers);
  await noteTable(db, table);

  progress('casting');
  const readings = await readOddCells(db, mapping, study);
  await decideFates(db, table, mapping);
  await makeBuildings(db, mapping, readings, source.path);
  const inventoryId = (await refusedYears(db, mapping)) ? parts.datedId : parts.inventoryId;

  progress('checking');
  const sizes = await readSizes(db, mapping);
  const notes = new BuildingNotes();
  const plans = readPlans(sizes, notes);
  const doubts = findContradictions(sizes, plans, notes);
  const inferred = inferSizes(sizes, plans, doubts);
  await noteListLengths(db, mapping, notes);
  await notes.write(db);
  if (doubts.column !== undefined) {
    const { check, ratio } = doubts.column;
    const shown = String(Number(ratio.toPrecision(3)));
    const [unit, name] = check === CHECKS.columnInFeet ? ['ft', 'feet'] : ['m', 'metres'];
    const theirs = mapping.columns.find(({ column }) => column.name === check.column)?.theirs ?? '';
    const entry = `${check.column}: {column: ${JSON.stringify(theirs)}, unit: ${unit}}`;
    const action = `${check.action}; if ${JSON.stringify(theirs)} is in ${name}, write under inventory.columns of the study: ${entry}`;
    await noteColumn(db, { ...check, action }, shown, `the median height per storey is ${shown} m`);
  }
  await noteUndesigned(db, mapping);
  await noteNearTwins(db, mapping);
  await notePartOf(db, mapping);
  await makeYearPools(db, mapping);
  if (pairs !== undefined) {
    await begin();
    await takeInNeighbours(db, pairs, inventoryId);
  }

  progress('storing');
  const number = Number(await db.value('SELECT coalesce(max(inventory_number), 0) + 1 FROM inventory'));
  await storeBuildings(db, number, mapping, { readings, sizes, plans, inferred, doubts }, begin);
  await storeYearPools(db, inventoryId);
  await storeFindings(db, inventoryId, table.hasLineBreaks ? table.lineOf : undefined);
  const rowsIn = table.written + table.rejects.length;
  await db.run('INSERT INTO inventory VALUES (?, ?, ?, ?, ?, ?, ?, ?)', [
    inventoryId,
    study.inventory.file,
    source.encoding,
    table.delimiter === '\t' ? 'tab' : table.delimiter,
    rowsIn,
    sizes.rowCount,
    '{}',
    number,
  ]);
  await storeAccount(db, inventoryId, number, rowsIn);
  const attributes = await countAttributes(db, number, mapping, inferred);
  await db.run('UPDATE inventory SET attributes = ? WHERE inventory_id = ?', [JSON.stringify(attributes), inventoryId]);
  return { ...(await readTaken(db, inventoryId)), known: false };
}

function at(folder: string, path: string): string {
  return isAbsolute(path) ? path : join(folder, path);
}

function fingerprint(
  source: Source,
  pairs: Source | undefined,
  study: IntakeStudy,
  answers: readonly Answer[],
  year = Infinity,
): string {
  const found = answersFingerprint(answers);
  const {
    file: _file,
    rejects_limit: _limit,
    ...reading
  } = study.inventory as IntakeStudy['inventory'] & { rejects_limit?: number };
  const rest = canonicalJson({
    version: INTAKE_VERSION,
    reading,
    words: study.words,
    pairs: pairs?.hash.copy().digest('hex') ?? null,
    ...(found === null ? {} : { answers: found }),
    ...(year === Infinity ? {} : { years_until: year }),
  });
  return source.hash.copy().update(rest, 'utf8').digest('hex').slice(0, 16);
}

/** An inventory that is in the database already. */
export async function readTaken(db: Database, inventoryId: string): Promise<TakenIn> {
  const [row] = await db.rows<{ rows_in: number; buildings: number; attributes: string }>(
    'SELECT rows_in, buildings, attributes FROM inventory WHERE inventory_id = ?',
    [inventoryId],
  );
  if (row === undefined) throw new Bug(`inventory ${inventoryId} is not in the database`);
  const counts = await db.rows<{ kind: 'rejected-row' | 'rejected-cell' | 'note'; count: number }>(
    'SELECT kind, count(*) AS count FROM finding WHERE inventory_id = ? GROUP BY kind',
    [inventoryId],
  );
  const findings = { 'rejected-row': 0, 'rejected-cell': 0, note: 0 };
  for (const { kind, count } of counts) findings[kind] = count;
  return {
    inventoryId,
    rowsIn: row.rows_in,
    buildings: row.buildings,
    account: await readAccount(db, inventoryId),
    attributes: JSON.parse(row.attributes) as Attributes,
    findings,
    known: true,
  };
}

async function noteTable(db: Database, table: Table): Promise<void> {
  const add = async (code: string, value: number, message: string, action: string): Promise<void> => {
    await db.run("INSERT INTO intake_finding VALUES (NULL, NULL, NULL, ?, ?, ?, ?, 'note')", [
      String(value),
      code,
      message,
      action,
    ]);
  };
  if (table.emptyRows > 0)
    await add('empty-rows', table.emptyRows, `${table.emptyRows} rows hold only delimiters`, 'read as blank lines');
  if (table.zeroBytes > 0)
    await add('zero-bytes', table.zeroBytes, `${table.zeroBytes} zero bytes inside cells`, 'read as blanks');
}

async function noteNearTwins(db: Database, mapping: Mapping): Promise<void> {
  const has = (name: string): boolean => mapping.columns.some(({ column }) => column.name === name);
  if (!has('lon') || !has('lat') || !has('floor_area_m2')) return;
  const check = CHECKS.nearTwin;
  await db.run(
    `INSERT INTO intake_finding
     WITH place AS (SELECT first_row, id, CAST(round(lon * 1e5) AS INTEGER) AS x, CAST(round(lat * 1e5) AS INTEGER) AS y,
         floor_area_m2 AS a FROM intake_building WHERE (lon <> 0 OR lat <> 0) AND floor_area_m2 IS NOT NULL),
     suspect AS (SELECT hash(x, y, a) AS h FROM place GROUP BY h HAVING count(*) > 1),
     twin AS (SELECT *, count(*) OVER (PARTITION BY x, y, a) AS n FROM place WHERE hash(x, y, a) IN (SELECT h FROM suspect))
     SELECT first_row, id, ?, id, ?, n || ' buildings share place and floor area', ?, 'note' FROM twin WHERE n > 1`,
    [check.column, check.code, check.action],
  );
}

async function dropScratch(db: Database): Promise<void> {
  // In a transaction that an error has ended nothing can be dropped; its rollback does it.
  const left = await db
    .rows<{ kind: string; name: string }>(
      `SELECT 'TABLE' AS kind, table_name AS name FROM duckdb_tables() WHERE temporary AND table_name LIKE 'intake%'
       UNION ALL SELECT 'VIEW', view_name FROM duckdb_views() WHERE temporary AND view_name LIKE 'intake%' ORDER BY kind DESC`,
    )
    .catch(() => []);
  for (const { kind, name } of left) await db.run(`DROP ${kind} ${name}`).catch(() => undefined);
}
