/**
 * What one key of a study says about another. The checks read the raw value, whatever else is wrong with it, so that all
 * problems of a file come at once; what the schema already refuses they leave alone.
 */
import { VS30_TABLES } from '../engineering/site/vs30.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';
import { SPECTRUM_REGISTER } from '../engineering/spectrum/definition.js';
import { showValue } from '../errors.js';
import { checkEditions } from './code-editions.js';
import { suggest } from './nearest.js';
import { checkOwnTable } from './own-table.js';
import type { Finding } from './problems.js';
import { checkVisits } from './survey-schema.js';

type Step = string | number;

/** Findings across keys in the plain value of a study file. */
export function crossCheck(study: unknown): Finding[] {
  return [
    ...checkSpectra(study),
    ...checkLevels(study),
    ...checkSlope(study),
    ...checkWords(study),
    ...checkVisits(at(study, 'survey')),
    ...checkBudget(study),
    ...checkEditions(at(study, 'code_history')),
    ...checkOwnTable(at(study, 'code_history')),
  ];
}

function checkSpectra(study: unknown): Finding[] {
  return entries(at(study, 'hazard', 'spectra')).flatMap(([name, entry]) => {
    const path = ['hazard', 'spectra', name];
    if (at(entry, 'code') === 'table') return checkTable(entry, path);
    const [sds_g, sd1_g, tl_s] = ['sds_g', 'sd1_g', 'tl_s'].map((key) => at(entry, key));
    if (typeof sds_g !== 'number' || typeof sd1_g !== 'number' || typeof tl_s !== 'number' || sds_g <= 0) return [];
    const corner_s = sd1_g / sds_g;
    if (tl_s > corner_s) return [];
    const message = `expected a period beyond the plateau's end sd1_g/sds_g = ${corner_s.toPrecision(3)} s, got ${tl_s}`;
    return [{ path: [...path, 'tl_s'], message }];
  });
}

function checkTable(entry: unknown, path: readonly Step[]): Finding[] {
  const periods = at(entry, 'periods_s');
  const ordinates = at(entry, 'ordinates_g');
  if (!Array.isArray(periods)) return [];
  const findings: Finding[] = [];
  if (Array.isArray(ordinates) && ordinates.length !== periods.length) {
    const message = `expected one ordinate for each of the ${periods.length} periods, got ${ordinates.length}`;
    findings.push({ path: [...path, 'ordinates_g'], message });
  }
  periods.forEach((period: unknown, i) => {
    const before: unknown = periods[i - 1];
    if (typeof period !== 'number') return;
    if (typeof before === 'number' && period <= before) {
      findings.push({
        path: [...path, 'periods_s', i],
        message: `expected a period > ${before}, got ${period}; periods increase`,
      });
    } else if (period === 0 && at(entry, 'interpolation') === 'log-log') {
      findings.push({
        path: [...path, 'periods_s', i],
        message: 'log-log needs periods > 0, got 0; use linear or leave it out',
      });
    }
  });
  return findings;
}

/** The places at which a level names a spectrum, with what stands there. */
function named(level: unknown): (readonly [readonly Step[], unknown])[] {
  const direct = (['spectrum', 'otherwise'] as const).map((key) => [[key], at(level, key)] as const);
  const mapped = entries(at(level, 'spectra')).map(([value, name]) => [['spectra', value], name] as const);
  return [...direct, ...mapped].filter(([, name]) => name !== undefined);
}

function checkLevels(study: unknown): Finding[] {
  const spectra = at(study, 'hazard', 'spectra');
  const known = entries(spectra).map(([name]) => name);
  const columns = at(study, 'inventory', 'columns');
  const titles = new Map<unknown, number>();
  return items(at(study, 'hazard', 'levels')).flatMap((level, i) => {
    const findings: Finding[] = [];
    const path = ['hazard', 'levels', i];
    for (const [below, name] of named(level)) {
      if (typeof name !== 'string' || known.includes(name)) continue;
      findings.push({ path: [...path, ...below], message: `no spectrum ${showValue(name)}${suggest(name, known)}` });
    }
    for (const [below, name] of named(level)) {
      const code = typeof name === 'string' ? at(spectra, name, 'code') : undefined;
      if (!SPECTRUM_REGISTER.some((entry) => entry.code === code && entry.reduced === true)) continue;
      const message = `${String(code)} contains a behaviour factor and serves base shear; levels read elastic spectra`;
      findings.push({ path: [...path, ...below], message });
    }
    const title = at(level, 'title');
    const first = titles.get(title);
    if (typeof title === 'string' && first !== undefined) {
      findings.push({
        path: [...path, 'title'],
        message: `level ${first + 1} has the title ${showValue(title)} already; name them apart`,
      });
    } else titles.set(title, i);
    return [
      ...findings,
      ...checkColumns(level, columns, path),
      ...checkClasses(level, path),
      ...checkPlaces(level, spectra, columns, path),
    ];
  });
}

/** Columns of the inventory of which a level needs one, by the word after `by`. */
const READ_BY: Readonly<Record<string, readonly string[]>> = {
  site_class: ['site_class'],
  hazard_zone: ['hazard_zone'],
  vs30: ['vs30_mps', 'site_class'],
  spectrum: ['spectrum'],
};

function checkColumns(level: unknown, columns: unknown, path: readonly Step[]): Finding[] {
  const by = at(level, 'by');
  const read = typeof by === 'string' && Object.hasOwn(READ_BY, by) ? (READ_BY[by] ?? []) : [];
  if (read.length === 0 || !isMapping(columns) || at(level, 'otherwise') !== undefined) return [];
  if (read.some((column) => at(columns, column) !== undefined)) return [];
  const remedy =
    by === 'site_class' && at(columns, 'vs30_mps') !== undefined
      ? 'read its vs30_mps with by: vs30 and classes:'
      : 'name it, or say otherwise:';
  const message = `inventory.columns names no ${read[0] ?? ''}, so no building would have a spectrum; ${remedy}`;
  return [{ path: [...path, 'by'], message }];
}

/** A level of grids alone needs to know where the buildings stand. */
function checkPlaces(level: unknown, spectra: unknown, columns: unknown, path: readonly Step[]): Finding[] {
  const names = named(level);
  const isGrid = ([, name]: (typeof names)[number]): boolean =>
    typeof name === 'string' && at(spectra, name, 'code') === HAZARD_GRID;
  if (names.length === 0 || !names.every(isGrid) || !isMapping(columns)) return [];
  const has = (column: string): boolean => at(columns, column) !== undefined;
  if ((has('lon') && has('lat')) || has('footprint')) return [];
  const message =
    'inventory.columns names no lon and lat, so no building would have a place on the grid; name them, or a footprint';
  return [{ path: [...path, ...(names[0]?.[0] ?? [])], message }];
}

/** Site classes that the code of a level by velocity does not have. */
function checkClasses(level: unknown, path: readonly Step[]): Finding[] {
  const code = at(level, 'classes');
  if (at(level, 'by') !== 'vs30' || typeof code !== 'string') return [];
  const table = Object.entries(VS30_TABLES).find(([name]) => name === code)?.[1];
  if (table === undefined) return [];
  const known = table.classes.map(({ site_class }) => site_class);
  return entries(at(level, 'spectra'))
    .filter(([site_class]) => !known.includes(site_class))
    .map(([site_class]) => ({
      path: [...path, 'spectra', site_class],
      message: `${code} has no site class ${showValue(site_class)} that a velocity tells; it has ${known.join(', ')}`,
      atKey: true,
    }));
}

function checkSlope(study: unknown): Finding[] {
  const k = at(study, 'ranking', 'k');
  const levels = items(at(study, 'hazard', 'levels'));
  const spectra = at(study, 'hazard', 'spectra');
  if ((k !== undefined && k !== 'from-levels') || levels.length === 0) return [];
  const findings: Finding[] = [];
  const years = new Set<number>();
  for (const [i, level] of levels.entries()) {
    const names = named(level).map(([, name]) => name);
    const found = names.map((name) => (typeof name === 'string' ? at(spectra, name) : undefined));
    // A level whose spectra are not there is reported elsewhere; nothing can be said about its return period.
    if (names.length === 0 || found.some((entry) => !isMapping(entry))) return [];
    const periods = new Set(found.map((entry) => at(entry, 'return_period_years')));
    if ([...periods].some((period) => period !== undefined && typeof period !== 'number')) return [];
    const stated = [...periods].filter((period) => typeof period === 'number');
    if (stated.length > 1) {
      const list = stated.toSorted((a, b) => a - b).join(' and ');
      const message = `the spectra of a level share one return_period_years, these have ${list}; make them alike, or give ranking.k as a number`;
      findings.push({ path: ['hazard', 'levels', i], message });
    }
    const [period] = stated;
    if (period !== undefined && periods.size === 1) years.add(period);
  }
  // Left out with one dated level the slope is assumed, and reported so; asked for by name it must be possible.
  if (k === 'from-levels' && findings.length === 0 && years.size < 2) {
    const message =
      `from-levels needs two levels whose spectra all state return_period_years, not the same; this study has ${years.size}; ` +
      'give k as a number 1 to 5, or a second level';
    findings.push({ path: ['ranking', 'k'], message });
  }
  return findings;
}

function checkWords(study: unknown): Finding[] {
  return entries(at(study, 'words')).flatMap(([kind, dictionary]) => {
    const seen = new Map<string, readonly [string, unknown]>();
    return entries(dictionary).flatMap(([theirs, ours]) => {
      const folded = theirs.trim().toLowerCase();
      const before = seen.get(folded);
      seen.set(folded, [theirs, ours]);
      if (before === undefined || before[1] === ours) return [];
      const message = `the same word as ${showValue(before[0])} but for case and blanks, with another meaning; keep one`;
      return [{ path: ['words', kind, theirs], message, atKey: true }];
    });
  });
}

/** A building on both lists, or twice on one: someone has to decide. */
function checkBudget(study: unknown): Finding[] {
  const seen = new Map<string, string>();
  return (['include', 'exclude'] as const).flatMap((name) =>
    items(at(study, 'budget', name)).flatMap((entry, i) => {
      const id = at(entry, 'id');
      if (typeof id !== 'string') return [];
      const before = seen.get(id);
      seen.set(id, name);
      if (before === undefined) return [];
      const message = `${showValue(id)} stands in budget.${before} already; keep one of the two`;
      return [{ path: ['budget', name, i, 'id'], message }];
    }),
  );
}

function isMapping(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function entries(value: unknown): [string, unknown][] {
  return isMapping(value) ? Object.entries(value) : [];
}

function items(value: unknown): readonly unknown[] {
  return Array.isArray(value) ? value : [];
}

function at(value: unknown, ...path: readonly string[]): unknown {
  return path.reduce<unknown>(
    (inner, key) => (isMapping(inner) && Object.hasOwn(inner, key) ? inner[key] : undefined),
    value,
  );
}
