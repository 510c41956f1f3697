import { formatNumber, formatQuantity, unitLabel } from '../../engineering/format.js';
import { unitOfName } from '../../engineering/hand.js';
import { HAZARD_GRID } from '../../engineering/spectrum/grid.js';
import { convert, findUnit } from '../../engineering/units.js';
import type { Unit } from '../../engineering/units.js';
import { Bug, EXIT, UserError } from '../../errors.js';
import { writeSpectra } from '../../exports/spectrum-files.js';
import { DEFAULT_PERIODS_S, readBy, readSpectrum, spectrumNames } from '../../exports/spectrum-reading.js';
import type { SpectrumSheet } from '../../exports/spectrum-reading.js';
import { loadStudy } from '../../study/load.js';
import type { LoadedStudy } from '../../study/load.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { markWords } from '../output/steps.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

export interface SpectrumCommandOptions {
  readonly study?: string;
  readonly at?: readonly number[];
  readonly csv?: string;
  readonly svg?: string;
  readonly lon?: number;
  readonly lat?: number;
  readonly units: 'si' | 'us';
  readonly json?: true;
}

/** `swaymark spectrum`: the study's spectra, one of them with its ordinates, or several side by side; as files too. */
export async function spectrum(names: readonly string[], options: SpectrumCommandOptions): Promise<number> {
  const { at, csv, svg, units, json, lon, lat } = options;
  if ((lon === undefined) !== (lat === undefined))
    throw new UserError('a place takes both --lon and --lat, in degrees');
  const place = lon === undefined || lat === undefined ? undefined : { lon, lat };
  const loaded = await loadStudy(findStudy(options.study));
  const asked = [...new Set(names)];
  const all = spectrumNames(loaded);
  // without a place the list names the grids and reads the others
  const grids = asked.length > 0 || place !== undefined ? [] : all.filter((name) => isGrid(loaded, name));
  const listed = asked.length === 0 ? all.filter((name) => !grids.includes(name)) : asked;
  const periods = at ?? (asked.length === 0 ? [] : DEFAULT_PERIODS_S);
  const sheets = listed.map((name) => readSpectrum(loaded, name, periods, place));
  const files = await writeSpectra(loaded, listed, at ?? [], { csv, svg }, place);
  const columns = terminalColumns();
  const [first] = sheets;
  if (json) printJson(asked.length === 1 ? first : sheets);
  else {
    const lines =
      asked.length === 0
        ? [
            ...(sheets.length === 0 ? [] : listLines(sheets, periods, columns)),
            ...(sheets.length > 0 && grids.length > 0 ? [''] : []),
            ...gridLines(loaded, grids, columns),
          ]
        : asked.length === 1 && first !== undefined
          ? sheetLines(first, units, columns)
          : besideLines(sheets, periods, columns);
    printLines([...lines, ...(files.length === 0 ? [] : ['']), ...files.map((file) => clean(`written: ${file}`))]);
  }
  return EXIT.clean;
}

function isGrid({ study }: LoadedStudy, name: string): boolean {
  return study.hazard.spectra[name]?.code === HAZARD_GRID;
}

/** What there is to say of grids without a place. */
function gridLines(loaded: LoadedStudy, names: readonly string[], columns: number): string[] {
  const { study, grids } = loaded;
  return names.flatMap((name) => {
    const entry = study.hazard.spectra[name];
    const grid = grids.get(String(entry?.['grid']));
    if (entry === undefined || grid === undefined) return [];
    const from = (lines: Float64Array): string =>
      `${formatNumber(lines[0] ?? NaN, 7)} to ${formatNumber(lines.at(-1) ?? NaN, 7)}°`;
    const words = `${name}: hazard grid ${String(entry['file'])}, ${String(entry['read'])}; longitude ${from(grid.lon)}, latitude ${from(grid.lat)}; read by: ${readBy(loaded, name).join('; ') || 'nobody'}; --lon and --lat read it at a place`;
    return wrap(clean(words), columns, '', '  ');
  });
}

/** Several spectra side by side: one column each, and the second over the first where there are two. */
function besideLines(sheets: readonly SpectrumSheet[], periods: readonly number[], columns: number): string[] {
  const ratio = sheets.length === 2;
  const head = [
    { title: 'T (s)', right: true },
    ...sheets.map(({ name }) => ({ title: clean(name), right: true, shrinkTo: 8 })),
    ...(ratio ? [{ title: 'second / first', right: true, spare: 1 }] : []),
  ];
  const rows = periods.map((period_s, i) => {
    const values = sheets.map(({ ordinates }) => ordinates[i]?.sa_g ?? NaN);
    const [one = NaN, two = NaN] = values;
    const marked = values.map((sa_g, s) => `${formatNumber(sa_g, 4)}${sheets[s]?.ordinates[i]?.beyond ? ' *' : ''}`);
    return [formatNumber(period_s, 4), ...marked, ...(ratio ? [formatNumber(two / one)] : [])];
  });
  const beyond = sheets.some(({ ordinates }) => ordinates.some((ordinate) => ordinate.beyond));
  return [
    ...sheets.flatMap((sheet) => [
      ...wrap(clean(`${placeName(sheet)}: ${sheet.title}; ${plateauWords(sheet)}`), columns, '', '    '),
      ...noteLines(sheet, columns),
    ]),
    '',
    styled('bold', 'S_a (g)'),
    ...table(head, rows, columns),
    ...(beyond ? ['* longer than the publication covers'] : []),
  ];
}

function placeName({ name, place }: SpectrumSheet): string {
  return place === null ? name : `${name} at longitude ${String(place.lon)}°, latitude ${String(place.lat)}°`;
}

function noteLines({ flags }: SpectrumSheet, columns: number): string[] {
  return flags.flatMap((flag) => wrap(`note: ${flag}`, columns, '  ', '      '));
}

function plateauWords({ plateau }: SpectrumSheet): string {
  if (!(plateau.to_s > plateau.from_s))
    return `largest ordinate ${formatQuantity(plateau.sa_g, 'g', 'si')} at ${formatQuantity(plateau.from_s, 's', 'si')}`;
  return `plateau ${formatQuantity(plateau.sa_g, 'g', 'si')} from ${formatQuantity(plateau.from_s, 's', 'si')} to ${formatQuantity(plateau.to_s, 's', 'si')}`;
}

function listLines(sheets: readonly SpectrumSheet[], at: readonly number[], columns: number): string[] {
  const head = [
    { title: 'Spectrum', shrinkTo: 8 },
    { title: 'Code', shrinkTo: 12 },
    { title: 'Plateau (g)', right: true },
    { title: 'Ends at (s)', right: true },
    ...at.map((period) => ({ title: `at ${formatNumber(period)} s`, right: true })),
    { title: 'Read by', shrinkTo: 12, spare: 1 },
  ];
  const rows = sheets.map(({ name, code, plateau, read_by, ordinates }) => [
    name,
    code,
    formatNumber(plateau.sa_g),
    formatNumber(plateau.to_s),
    ...ordinates.map(({ sa_g }) => formatNumber(sa_g)),
    read_by.length === 0 ? 'nobody' : read_by.join('; ').replaceAll(/(?:site class|hazard zone|spectrum) (?!by)/g, ''),
  ]);
  return table(head, rows, columns);
}

function parameterLines({ parameters }: SpectrumSheet, columns: number): string[] {
  return Object.entries(parameters).flatMap(([name, value]) => {
    const text = Array.isArray(value) ? value.join('; ') : String(value);
    const unit = name === 'return_period_years' ? null : unitOfName(name);
    return wrap(clean(`${name} = ${text}${unit === null ? '' : ` ${unitLabel(unit, 'si')}`}`), columns, '  ', '      ');
  });
}

function sheetLines(sheet: SpectrumSheet, display: 'si' | 'us', columns: number): string[] {
  const { title, source, verified, corners_s, valid_to_s, read_by, ordinates } = sheet;
  const small = unitCalled(display === 'us' ? 'in' : 'mm');
  const head = [
    { title: 'T (s)', right: true },
    { title: 'S_a (g)', right: true },
    { title: `S_d (${small.label})`, right: true },
    { title: 'Branch', shrinkTo: 12 },
  ];
  const rows = ordinates.map(({ period_s, sa_g, sd_m, clause, beyond }) => [
    formatNumber(period_s, 4),
    formatNumber(sa_g, 4),
    formatNumber(convert(sd_m, unitCalled('m'), small)),
    beyond ? `${clause}; beyond the publication` : clause,
  ]);
  return [
    styled('bold', clean(placeName(sheet))),
    ...wrap(`${title}, ${source} [${markWords(verified)}]`, columns),
    ...wrap(`read by: ${read_by.length === 0 ? 'nobody' : clean(read_by.join('; '))}`, columns, '', '  '),
    '',
    ...parameterLines(sheet, columns),
    `  ${plateauWords(sheet)}`,
    ...wrap(
      `corners at ${corners_s.map((corner) => formatQuantity(corner, 's', display)).join(', ')}`,
      columns,
      '  ',
      '      ',
    ),
    ...(valid_to_s === null ? [] : [`  covers periods up to ${formatQuantity(valid_to_s, 's', display)}`]),
    ...noteLines(sheet, columns),
    '',
    ...table(head, rows, columns),
  ];
}

function unitCalled(id: string): Unit {
  const unit = findUnit(id);
  if (unit === undefined) throw new Bug(`no unit ${id}`);
  return unit;
}
