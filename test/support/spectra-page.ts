/** The page of spectrum codes, made from the register: docs/spectra.md must say the same. */
import { describeSpec } from '../../src/engineering/formula.js';
import type { AnyRecord, InputSpec } from '../../src/engineering/formula.js';
import { cite } from '../../src/engineering/source.js';
import type { Verified } from '../../src/engineering/source.js';
import { VS30_TABLES } from '../../src/engineering/site/vs30.js';
import { parametersOf } from '../../src/engineering/spectrum/code.js';
import type { SpectrumCode } from '../../src/engineering/spectrum/code.js';
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
  ].join('\n\n')}\n`;
}
