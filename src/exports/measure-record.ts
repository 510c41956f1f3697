/** A vibration record from its file to the period, the picture and the row for the inventory. */
import { basename } from 'node:path';
import { measureRecord } from '../engineering/vibration/measure.js';
import type { MeasureOptions, Measurement } from '../engineering/vibration/measurement.js';
import { readVibrationRecord, within } from '../inventory/vibration-record.js';
import type { RecordRequest, VibrationRecord } from '../inventory/vibration-record.js';
import { vibrationSvg } from '../reports/vibration-chart.js';
import { csvText } from './csv-text.js';
import { NamedFile } from './write-named.js';

export interface MeasureRequest extends RecordRequest, MeasureOptions {
  readonly svg?: string;
}

export interface MeasuredRecord {
  readonly record: VibrationRecord;
  readonly measured: Measurement;
  /** Path of the picture; null when none was asked for. */
  readonly svg: string | null;
}

/**
 * Reads `path`, measures it and writes the picture where one is asked for.
 * @throws UserError when the file is no record, nothing stands out, or the picture cannot be written.
 */
export async function measureFile(path: string, request: MeasureRequest): Promise<MeasuredRecord> {
  const read = { path, name: path, what: 'the record that is measured', place: null };
  const file = await NamedFile.claimAny(request.svg, '--svg', { study: null, reads: [read] });
  const record = readVibrationRecord(path, request);
  const measured = within(path, () => measureRecord(record.signal, request));
  if (file === null) return { record, measured, svg: null };
  const svg = await vibrationSvg(measured, `${basename(path)}, ${record.channel.name}`, record.channel.unit);
  return { record, measured, svg: await file.write(svg) };
}

/** The lines of an inventory that hold the measurement: header and row. A free decay is a forced vibration of small amplitude. */
export function inventoryLines(
  { kind, period_s }: Measurement,
  direction: 'longitudinal' | 'transverse',
  id: string,
): readonly string[] {
  const amplitude = kind === 'decay' ? 'forced' : 'ambient';
  const text = csvText(
    ['id', `measured_period_${direction}_s`, 'measured_amplitude'],
    [[id, Number(period_s.toPrecision(4)), amplitude]],
  );
  return text.replace('\ufeff', '').trimEnd().split('\r\n');
}
