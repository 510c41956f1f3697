/** Spectra that stand in a table of their own beside the study: read with the study, so that its fingerprint covers what they say. */
import { isAbsolute, join } from 'node:path';
import type { Study } from './schema.js';
import { TABLE_FILE } from './spectrum-codes.js';
import type { SpectrumEntry } from './spectrum-codes.js';
import { loadSpectrumFile } from './spectrum-file.js';
import type { SpectrumUnit } from './spectrum-units.js';

/**
 * `study` with every spectrum of code table-file replaced by the table it names, paths relative to `folder`; how each file was read
 * stands in its note.
 * @throws UserError naming file and line.
 */
export async function withTableFiles(study: Study, folder: string): Promise<Study> {
  const spectra: Record<string, SpectrumEntry> = {};
  for (const [name, entry] of Object.entries(study.hazard.spectra))
    spectra[name] = entry.code === TABLE_FILE ? await tableOf(entry, folder) : entry;
  return { ...study, hazard: { ...study.hazard, spectra } };
}

async function tableOf({ file, unit, note, ...entry }: SpectrumEntry, folder: string): Promise<SpectrumEntry> {
  const path = String(file);
  const interpolation = entry['interpolation'] === 'log-log' ? 'log-log' : 'linear';
  const { periods_s, ordinates_g, statements } = await loadSpectrumFile(isAbsolute(path) ? path : join(folder, path), {
    unit: unit as SpectrumUnit | undefined,
    interpolation,
  });
  const read = `read from ${path}: ${statements.join(', ')}`;
  return { ...entry, code: 'table', periods_s, ordinates_g, note: note === undefined ? read : `${note}; ${read}` };
}
