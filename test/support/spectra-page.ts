/** The page of spectrum codes, made from the register: docs/spectra.md must say the same. */
import { describeSpec } from '../../src/engineering/formula.js';
import type { AnyRecord, InputSpec } from '../../src/engineering/formula.js';
import { cite } from '../../src/engineering/source.js';
import type { Verified } from '../../src/engineering/source.js';
import { VS30_TABLES } from '../../src/engineering/site/vs30.js';
import { parametersOf } from '../../src/engineering/spectrum/code.js';
import type { SpectrumCode } from '../../src/engineering/spectrum/code.js';
import { GRID_RECORDS } from '../../src/engineering/spectrum/grid-records.js';
import { SPECTRUM_REGISTER } from '../../src/engineering/spectrum/definition.js';

const MARKS: Readonly<Record<Verified, string>> = {
  printed: 'read in the publication',
  restated: 'restated by another publication',
  memory: 'from memory, to be checked',
  judgement: 'judgement',
  mechanics: 'mechanics',
};

function parameterLine(spec: InputSpec): string {
  const fallback = spec.fallback === undefined ? '' : `; ${String(spec.fallback)} when left out`;
  return `- \`${spec.name}\`: ${spec.meaning}; ${describeSpec(spec)}${fallback}`;
}

function recordLine({ id, source, verified, note }: AnyRecord): string {
  return `Record \`${id}\`: ${cite(source)} (${MARKS[verified]}).${note === undefined ? '' : ` ${note}`}`;
}

function section(entry: SpectrumCode): string {
  const records = entry.choice === undefined ? [entry.record] : Object.values(entry.choice.records);
  return [
    `## ${entry.code}`,
    `${entry.title}.${entry.reduced === true ? ' It serves base shear; no level may read it.' : ''}`,
    parametersOf(entry).map(parameterLine).join('\n'),
    ...records.map(recordLine),
  ].join('\n\n');
}

const WHO_READS: readonly string[] = [
  '- `{title, spectrum}`: every building the same.',
  '- `{title, by: site_class, spectra: {C: …, D: …}, otherwise}`, or `by: hazard_zone`: by a column of the inventory.',
  `- \`{title, by: vs30, classes: …, spectra: {C: …, D: …}, otherwise}\`: by the site class that \`vs30_mps\` has by the code named (${Object.keys(VS30_TABLES).join(', ')}); letters do not carry from one code to another. Where the velocity is blank the class on record is read, and where the two differ the velocity is; both are flagged.`,
  '- `{title, by: spectrum, spectra: {…}, otherwise}`: by the column `spectrum` of the inventory, whose words are names of `hazard.spectra`, or those listed under `spectra`; a second level lists them, so that the same words read its own spectra.',
];

const TABLE_FILE = `## table-file

A table in a file beside the study, as people have it: two columns (period, S_a), or the same laid out as a row; comma, semicolon or tab between cells, point or comma for decimals, headings or none. It is read with the study, so that the fingerprint of the study covers what it says.

- \`file\`: the path of the table, relative to the study
- \`unit\`: g, m/s2, cm/s2 or %g; left out, the heading names it
- \`interpolation\`: between the periods; linear or log-log`;

const HAZARD_GRID = `## hazard-grid

Hazard that varies over the map: each building reads its own spectrum, at its own longitude and latitude.

- \`file\`: the path of the grid, relative to the study: CSV or Parquet with \`lon\`, \`lat\` and one column a period, named by it (\`SA(0.2)\`, \`sa_0.2_g\`, \`PGA\`); one row a node, nodes on evenly spaced lines of longitude and latitude, in any order. A row without ordinates is a hole; other columns are left out, and named
- \`unit\`: of the ordinates, g, m/s2, cm/s2 or %g; left out, the headings name it
- \`interpolation\`: between the periods; linear or log-log

For example:

    spectra:
      map-475: {code: hazard-grid, file: map-475.csv, unit: g, interpolation: log-log, return_period_years: 475}
      map-2475: {code: hazard-grid, file: map-2475.parquet, unit: g, interpolation: log-log, return_period_years: 2475}
    levels:
      - {title: design, spectrum: map-475}
      - {title: rare, spectrum: map-2475}

Between the four nodes around a building each ordinate is bilinear in ln S_a; at a node it is the node's. The building then has an ordinary table, with its plateau where its largest ordinate stands. Any level may name a grid where it may name another spectrum, by site class or zone too. The ordinates are taken as they are: those of a map for rock serve buildings on rock, and site effects are not added.

- **Outside.** A building outside the grid, in a cell that lacks a node, or without coordinates is not ranked, with a reason naming the grid; it stays in the account of rows, and \`rejects.csv\` has a line for it (kind \`rejected-building\`). \`check\` says how many there will be. A study may map \`lon\` and \`lat\`, or a footprint.
- **k from two levels.** A grid counts as one hazard zone: one k for all buildings that read it, at their median period, where the ratio of the two levels is the median one; beside it stands what k would be for the middle 90 % of the buildings. Where that range is wide, split the study, or name grids by zone.
- **Kept.** The grid is kept with the run, once for all runs that read it: \`explain\`, \`compare\` and \`refresh\` work with its file gone. A file that is there is read again; with other contents it is another study, and \`compare\` shows what that did to demand. \`refresh --set hazard.spectra.map-475.file=new.csv\` ranks by another map.
- **Shown.** The dashboard draws the median of the ordinates of the buildings, period by period, and the band from 5 to 95 %. The page carries the nodes that its buildings read, so that every hand calculation begins at the four nodes. \`swaymark spectrum map-475 --lon 13.42 --lat 43.61\` reads a grid at a place.

${GRID_RECORDS.map(recordLine).join('\n\n')}`;

/** The page as Markdown. */
export function spectraPage(): string {
  return `${[
    '# Spectra a study may name',
    'Each entry of `hazard.spectra` in the study has a `code` and its parameters. `swaymark calc <record>` evaluates one alone, with `--svg file` as a picture; `swaymark spectrum` reads and compares those of a study.',
    '## Who reads which',
    'Each entry of `hazard.levels` says which spectrum a building reads; the first level ranks, all are reported.',
    WHO_READS.join('\n'),
    'A building without a value, or with one that is not listed, reads `otherwise`; without it the building is not ranked, and the reason names what is missing.',
    ...SPECTRUM_REGISTER.map(section),
    TABLE_FILE,
    HAZARD_GRID,
  ].join('\n\n')}\n`;
}
