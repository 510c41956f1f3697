import { formatNumber, formatQuantity, unitLabel } from '../../engineering/format.js';
import { unitOfName } from '../../engineering/hand.js';
import { convert, findUnit } from '../../engineering/units.js';
import type { Unit } from '../../engineering/units.js';
import { Bug, EXIT } from '../../errors.js';
import { readSpectrum, spectrumNames } from '../../exports/spectrum-reading.js';
import type { SpectrumSheet } from '../../exports/spectrum-reading.js';
import { loadStudy } from '../../study/load.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { markWords } from '../output/steps.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

interface Options {
  readonly study?: string;
  readonly at?: readonly number[];
  readonly units: 'si' | 'us';
  readonly json?: true;
}

/** `swaymark spectrum`: the study's spectra, or one of them with its ordinates. */
export async function spectrum(name: string | undefined, options: Options): Promise<number> {
  const loaded = await loadStudy(findStudy(options.study));
  if (name === undefined) {
    const sheets = spectrumNames(loaded).map((each) => readSpectrum(loaded, each, options.at ?? []));
    if (options.json) printJson(sheets);
    else printLines(listLines(sheets, options.at ?? [], terminalColumns()));
    return EXIT.clean;
  }
  const sheet = readSpectrum(loaded, name, options.at);
  if (options.json) printJson(sheet);
  else printLines(sheetLines(sheet, options.units, terminalColumns()));
  return EXIT.clean;
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
    read_by.length === 0 ? 'nobody' : read_by.join('; ').replaceAll(/(?:site class|hazard zone) /g, ''),
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
  const { name, title, source, verified, corners_s, plateau, valid_to_s, read_by, ordinates } = sheet;
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
    styled('bold', clean(name)),
    ...wrap(`${title}, ${source} [${markWords(verified)}]`, columns),
    ...wrap(`read by: ${read_by.length === 0 ? 'nobody' : clean(read_by.join('; '))}`, columns, '', '  '),
    '',
    ...parameterLines(sheet, columns),
    `  plateau ${formatQuantity(plateau.sa_g, 'g', display)} from ${formatQuantity(plateau.from_s, 's', display)} to ${formatQuantity(plateau.to_s, 's', display)}`,
    ...wrap(
      `corners at ${corners_s.map((corner) => formatQuantity(corner, 's', display)).join(', ')}`,
      columns,
      '  ',
      '      ',
    ),
    ...(valid_to_s === null ? [] : [`  covers periods up to ${formatQuantity(valid_to_s, 's', display)}`]),
    '',
    ...table(head, rows, columns),
  ];
}

function unitCalled(id: string): Unit {
  const unit = findUnit(id);
  if (unit === undefined) throw new Bug(`no unit ${id}`);
  return unit;
}
