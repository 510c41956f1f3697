import { formatNumber } from '../../engineering/format.js';
import type { DirectionName } from '../../engineering/direction.js';
import type { RecordKind } from '../../engineering/vibration/kind.js';
import type { Measurement } from '../../engineering/vibration/measurement.js';
import { EXIT } from '../../errors.js';
import { inventoryLines, measureFile } from '../../exports/measure-record.js';
import type { MeasuredRecord } from '../../exports/measure-record.js';
import type { VibrationRecord } from '../../inventory/vibration-record.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

export interface MeasureCommandOptions {
  readonly rateHz?: number;
  readonly time?: string;
  readonly channel?: string;
  readonly kind?: RecordKind;
  readonly windowS?: number;
  readonly bandHz?: readonly [number, number];
  readonly fromS?: number;
  readonly toS?: number;
  readonly direction?: DirectionName;
  readonly id?: string;
  readonly svg?: string;
  readonly json?: true;
}

/** `swaymark measure`: a vibration record to the period of its building. */
export async function measure(file: string, options: MeasureCommandOptions): Promise<number> {
  const { rateHz, time, channel, kind, windowS, bandHz, fromS, toS, svg } = options;
  const result = await measureFile(file, {
    ...(rateHz === undefined ? {} : { rate_hz: rateHz }),
    ...(time === undefined ? {} : { time }),
    ...(channel === undefined ? {} : { channel }),
    ...(kind === undefined ? {} : { kind }),
    ...(windowS === undefined ? {} : { window_s: windowS }),
    ...(bandHz === undefined ? {} : { band_hz: bandHz }),
    ...(fromS === undefined ? {} : { from_s: fromS }),
    ...(toS === undefined ? {} : { to_s: toS }),
    ...(svg === undefined ? {} : { svg }),
  });
  const row = inventoryLines(result.measured, options.direction ?? 'longitudinal', options.id ?? '');
  if (options.json) printJson(asJson(file, result, row));
  else printLines(lines(file, result, row, options, Math.min(terminalColumns(), 100)));
  return EXIT.clean;
}

const number = formatNumber;
// As many digits as the error leaves, three to six.
function withError(value: number, error: number, unit: string, least = 3): string {
  if (Number.isNaN(error) || error <= 0) return `${number(value, 4)} ${unit}`;
  const digits = Math.min(6, Math.max(least, Math.ceil(Math.log10(value / error)) + 1));
  return `${number(value, digits)} ${unit} ± ${number(error, 2)} ${unit}`;
}

function lines(
  file: string,
  { record, measured, svg }: MeasuredRecord,
  row: readonly string[],
  { direction, id }: MeasureCommandOptions,
  columns: number,
): string[] {
  const indent = (text: string): string[] => wrap(clean(text), columns, '  ', '      ');
  const missing = [
    ...(direction === undefined
      ? ['the direction is taken as longitudinal; --direction transverse for the other']
      : []),
    ...(id === undefined ? ['the id of the building goes in front; --id writes it'] : []),
  ];
  return [
    ...wrap(clean(sourceLine(file, record)), columns),
    ...record.notes.flatMap((note) => indent(note)),
    '',
    ...resultLines(measured).flatMap(([name, value]) => [
      ...wrap(clean(value), columns, styled('bold', name.padEnd(LABEL)), ' '.repeat(LABEL)),
    ]),
    '',
    ...peakLines(measured, columns),
    ...conditionLines(measured, columns),
    ...measured.warnings.flatMap((warning) => wrap(clean(`note: ${warning}`), columns, '', '  ')),
    ...(measured.warnings.length === 0 ? [] : ['']),
    ...(svg === null ? [] : [...wrap(clean(`spectrum drawn in ${svg}`), columns), '']),
    styled('bold', 'For the inventory'),
    ...row.map((line) => `  ${clean(line)}`),
    ...missing.flatMap((text) => wrap(text, columns, '', '  ')),
    ...wrap(
      'Measured in small vibration: before a design spectrum is read the period is lengthened (swaymark methods swaymark/period/measured-small).',
      columns,
    ),
  ];
}

const LABEL = 15;

function sourceLine(file: string, { channel, columns, channels, time, signal, duration_s }: VibrationRecord): string {
  const unit = channel.unit === null ? 'unit not stated' : channel.unit;
  const others = channels.filter((one) => one !== channel).map(({ name }) => name);
  const rate = `${number(signal.rate_hz, 4)} Hz by ${time === null ? '--rate-hz' : time.name}`;
  const rest = others.length === 0 ? '' : `; not read: ${others.join(', ')} (--channel)`;
  return `${file}: channel ${channel.name} (column ${String(channel.number)} of ${String(columns)}, ${unit}), ${number(duration_s, 4)} s at ${rate}${rest}`;
}

function resultLines(measured: Measurement): (readonly [string, string])[] {
  const { kind, kindReason, damping, decay, cuts } = measured;
  const bound = damping.upperBound ? 'at most ' : '';
  const cut = [
    ...(cuts.gaps === 0
      ? []
      : [`${String(cuts.gaps)} ${cuts.gaps === 1 ? 'gap' : 'gaps'} of ${number(cuts.gap_s)} s in all`]),
    ...(cuts.flat === 0 ? [] : [`${String(cuts.flat)} samples that repeat one value`]),
    ...(cuts.unreadable === 0 ? [] : [`${String(cuts.unreadable)} without a value`]),
  ];
  return [
    ['Period', withError(measured.period_s, measured.period_se_s, 's')],
    ['Frequency', withError(measured.frequency_hz, measured.frequency_se_hz, 'Hz')],
    [
      'Damping',
      `${bound}${withError(100 * damping.ratio, 100 * damping.ratio_se, '%', 2)} of critical, by ${damping.method === 'half-power' ? 'the half-power bandwidth' : 'the logarithmic decrement'}`,
    ],
    ['Record', `${kind === 'ambient' ? 'ambient vibration' : 'free decay'}: ${kindReason}`],
    ...(kind === 'ambient' ? [ambientWindows(measured)] : decay === null ? [] : [decayPeaks(measured, decay)]),
    [
      'Signal',
      `${number(measured.over_background_db, 2)} dB over the background; searched ${number(measured.band_hz[0])} to ${number(measured.band_hz[1])} Hz`,
    ],
    ...(cut.length === 0 ? [] : [['Cut out', cut.join(', ')] as const]),
  ];
}

function ambientWindows({
  windows,
  window_s,
  resolution_hz,
  frequency_hz,
  covered_s,
}: Measurement): readonly [string, string] {
  return [
    'Windows',
    `${String(windows)} of ${number(window_s)} s, overlapping by half: resolution ${number(resolution_hz)} Hz, ${number(frequency_hz * window_s)} cycles each, ${number(frequency_hz * covered_s)} in all`,
  ];
}

function decayPeaks(
  _measured: Measurement,
  { whole, halves, peaks }: NonNullable<Measurement['decay']>,
): readonly [string, string] {
  const range = `${String(peaks.length)} over ${number(whole.cycles)} cycles, amplitude ${number(whole.first_amplitude)} to ${number(whole.last_amplitude)}`;
  if (halves === null) return ['Peaks', range];
  const [large, small] = halves.map(
    (half) => `${number(half.period_s, 4)} s and ${number(100 * half.damping_ratio, 2)} %`,
  );
  return ['Peaks', `${range}; the larger half by itself gives ${large ?? ''}, the smaller ${small ?? ''}`];
}

function peakLines({ peaks }: Measurement, columns: number): string[] {
  if (peaks.length < 2) return [];
  const head = [
    { title: 'Peak (Hz)', right: true },
    { title: 'T (s)', right: true },
    { title: 'over background (dB)', right: true },
    { title: 'share of the highest', right: true, spare: 1 },
    { title: '' },
  ];
  const rows = peaks
    .slice(0, 12)
    .map((peak) => [
      number(peak.frequency_hz, 4),
      number(peak.period_s, 4),
      number(peak.over_background_db, 2),
      number(peak.share, 2),
      peak.chosen ? 'taken' : '',
    ]);
  return [...table(head, rows, columns), ''];
}

function conditionLines({ conditions }: Measurement, columns: number): string[] {
  if (conditions.length === 0) return [];
  const head = [
    { title: 'Condition', shrinkTo: 20 },
    { title: 'asks' },
    { title: 'found', right: true },
    { title: '' },
  ];
  const rows = conditions.map(({ name, asks, value, met }) => [name, asks, number(value), met ? 'met' : 'not met']);
  return [...table(head, rows, columns), ...wrap(`(${conditions[0]?.source ?? ''})`, columns), ''];
}

function asJson(file: string, { record, measured, svg }: MeasuredRecord, row: readonly string[]): unknown {
  const { spectrum: _spectrum, decay, cuts, conditions, ...rest } = measured;
  const { stretches: _stretches, ...counts } = cuts;
  return {
    file,
    channel: record.channel,
    time: record.time,
    rate_hz: record.signal.rate_hz,
    duration_s: record.duration_s,
    ...rest,
    conditions,
    cuts: counts,
    decay: decay === null ? null : { whole: decay.whole, halves: decay.halves, beats: decay.beats, peaks: decay.peaks },
    notes: record.notes,
    inventory: row,
    svg,
  };
}
