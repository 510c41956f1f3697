/** What a run takes from its spectra. */
import { compileContext } from '../engineering/assess/context.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { Assumption } from '../engineering/page-contract.js';
import { VS30_TABLES } from '../engineering/site/vs30.js';
import { cite } from '../engineering/source.js';
import { flagWords } from '../engineering/spectrum/flags.js';
import { HAZARD_GRID } from '../engineering/spectrum/grid.js';

/** What the spectra that some level reads say about their parameters, and by which table a velocity becomes a site class. */
export function spectrumAssumptions(settings: AssessSettings): readonly Assumption[] {
  const { levels } = settings;
  const read = new Set(levels.flatMap(({ spectra, otherwise }) => [...Object.values(spectra), otherwise]));
  const codes = new Set(levels.flatMap(({ classes }) => (classes === undefined ? [] : [classes])));
  return [
    ...[...codes].map((code) => ({
      id: `site-class-${code}`,
      statement: 'Site class from the shear-wave velocity of the upper 30 m; the class on record where there is none',
      value: code,
      source: `${VS30_TABLES[code].source}, ${VS30_TABLES[code].verified === 'memory' ? 'from memory' : 'restated'}`,
    })),
    ...Object.entries(settings.spectra)
      .filter(([name, { code }]) => code === HAZARD_GRID && read.has(name))
      .map(([name, entry]) => ({
        id: `hazard-grid-${name}`,
        statement: `Each building reads its own spectrum from the grid ${name}: bilinear in ln S_a between the four nodes around it, ${entry['interpolation'] === 'log-log' ? 'log-log' : 'linear'} between periods; one k for all of it, as for a zone`,
        value: String(entry['file']),
        source: `file of the study (${String(entry['read'])}); contents ${String(entry['grid'])}`,
      })),
    ...Object.values(compileContext(settings).spectra)
      .filter(({ name }) => read.has(name))
      .flatMap(({ name, compiled, record }) =>
        flagWords(compiled).map((statement, i) => ({
          id: `spectrum-${name}-${String(i + 1)}`,
          statement,
          value: name,
          source: cite(record.source),
        })),
      ),
  ];
}
