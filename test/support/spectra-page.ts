/** The page of spectrum codes, made from the register: docs/spectra.md must say the same. */
import { describeSpec } from '../../src/engineering/formula.js';
import type { AnyRecord, InputSpec } from '../../src/engineering/formula.js';
import { cite } from '../../src/engineering/source.js';
import type { Verified } from '../../src/engineering/source.js';
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

/** The page as Markdown. */
export function spectraPage(): string {
  return `${[
    '# Spectra a study may name',
    'Each entry of `hazard.spectra` in the study has a `code` and its parameters. `swaymark calc <record>` evaluates one alone.',
    ...SPECTRUM_REGISTER.map(section),
  ].join('\n\n')}\n`;
}
