/** Spectra that stand in a table of their own beside the study: read with the study, so that its fingerprint covers what they say. */
import { isAbsolute, join } from 'node:path';
import { OWN_FAMILY_ID } from '../engineering/capacity/families.js';
import { loadOwnTable } from './own-table-file.js';
import type { Study } from './schema.js';
import { TABLE_FILE } from './spectrum-codes.js';
import type { SpectrumEntry } from './spectrum-codes.js';
import { loadSpectrumFile } from './spectrum-file.js';
import type { SpectrumUnit } from './spectrum-units.js';

/**
 * `study` with every spectrum of code table-file replaced by the table it names, and a file of eras by its rows, paths relative to
 * `folder`; how each file of a spectrum was read stands in its note.
 * @throws UserError naming file and line.
 */
export async function withTableFiles(study: Study, folder: string): Promise<Study> {
  const spectra: Record<string, SpectrumEntry> = {};
  for (const [name, entry] of Object.entries(study.hazard.spectra))
    spectra[name] = entry.code === TABLE_FILE ? await tableOf(entry, folder) : entry;
  return { ...study, hazard: { ...study.hazard, spectra }, code_history: await withEras(study.code_history, folder) };
}

/** The study's own table of eras in place of the file that holds it. */
async function withEras(history: Study['code_history'], folder: string): Promise<Study['code_history']> {
  if (history.family !== OWN_FAMILY_ID || history.table_file === undefined) return history;
  const { table_file, ...rest } = history;
  return { ...rest, table: [...(await loadOwnTable(isAbsolute(table_file) ? table_file : join(folder, table_file)))] };
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
