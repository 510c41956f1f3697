/** The picture of a measured record: its spectrum, and the decay where it is one. Drawn without a display, in plain colours. */
import { formatNumber } from '../engineering/format.js';
import type { Measurement } from '../engineering/vibration/measurement.js';
import { LINE, MARK, SOFT, svgOf } from './picture.js';

const WIDTH = 680;
const MOST_POINTS = 1500;

/** What the picture says, in words. */
export function vibrationSentence(measured: Measurement): string {
  const { frequency_hz, period_s, over_background_db, band_hz, kind, decay, close_hz } = measured;
  const spectrum =
    `Spectrum from ${formatNumber(band_hz[0])} to ${formatNumber(band_hz[1])} Hz: the peak taken as the fundamental mode lies at ` +
    `${formatNumber(frequency_hz, 4)} Hz, a period of ${formatNumber(period_s, 4)} s, ${formatNumber(over_background_db, 2)} dB over the background` +
    `${close_hz.length === 0 ? '' : `, with another at ${close_hz.map((f) => `${formatNumber(f)} Hz`).join(' and ')} beside it`}.`;
  if (kind === 'ambient' || decay === null) return spectrum;
  const { whole, peaks } = decay;
  return `${spectrum} The free decay: ${String(peaks.length)} peaks over ${formatNumber(whole.cycles)} cycles fall to ${formatNumber((100 * whole.last_amplitude) / whole.first_amplitude, 2)} % along an exponential of ${formatNumber(100 * whole.damping_ratio)} % of critical damping.`;
}

/** The picture as SVG text. `unit` is that of the channel, as its header writes it. */
export async function vibrationSvg(measured: Measurement, title: string, unit: string | null): Promise<string> {
  const charts = [spectrumChart(measured, unit), ...(measured.decay === null ? [] : [decayChart(measured, unit)])];
  return svgOf({ title: { text: title, subtitle: [subtitleOf(measured), keyOf(measured)] }, vconcat: charts }, title, vibrationSentence(measured));
}

function subtitleOf({ frequency_hz, period_s, period_se_s, damping }: Measurement): string {
  const error = Number.isNaN(period_se_s) ? '' : ` ± ${formatNumber(period_se_s, 2)}`;
  return `T = ${formatNumber(period_s, 4)}${error} s, f = ${formatNumber(frequency_hz, 4)} Hz, damping ${damping.upperBound ? 'at most ' : ''}${formatNumber(100 * damping.ratio, 2)} % of critical`;
}

function keyOf({ damping, peaks, decay }: Measurement): string {
  return [
    'dashed grey: background',
    ...(damping.half_power_hz === null ? [] : ['shaded: between the half-power points']),
    ...(peaks.length > 1 ? ['dotted: other peaks'] : []),
    ...(decay === null ? [] : ['dots: peaks used, dashed: the fitted decay']),
  ].join('; ');
}

// The highest value of each of many equal parts of the logarithmic axis: no peak is lost.
function spectrumPoints({ spectrum, band_hz }: Measurement): { f: number; s: number; b: number }[] {
  const { step_hz, density, background } = spectrum;
  const [low, high] = band_hz;
  const points: { f: number; s: number; b: number }[] = [];
  let part = -1;
  const last = Math.min(density.length - 1, Math.floor(high / step_hz));
  for (let i = Math.max(1, Math.ceil(low / step_hz)); i <= last; i += 1) {
    const f = i * step_hz;
    const s = Math.sqrt(density[i] ?? 0);
    if (!(s > 0)) continue;
    const here = Math.floor((Math.log(f / low) / Math.log(high / low)) * MOST_POINTS);
    const before = points.at(-1);
    if (here === part && before !== undefined) {
      if (s > before.s) points[points.length - 1] = { f, s, b: before.b };
    } else points.push({ f, s, b: Math.sqrt(background(f)) });
    part = here;
  }
  return points;
}

function spectrumChart(measured: Measurement, unit: string | null): unknown {
  const { frequency_hz, period_s, damping, peaks } = measured;
  const x = { field: 'f', type: 'quantitative', scale: { type: 'log', nice: false, domain: [...measured.band_hz] }, title: 'Frequency (Hz)', axis: { format: '~r', tickCount: 8 } };
  const y = { field: 's', type: 'quantitative', scale: { type: 'log', nice: false }, title: `Amplitude density (${unit ?? 'unit'}/√Hz)`, axis: { format: '.0e', tickCount: 6 } };
  const points = spectrumPoints(measured);
  const top = Math.max(...points.map(({ s }) => s));
  const others = peaks.filter(({ chosen }) => !chosen).map(({ frequency_hz: f }) => ({ f, text: `${formatNumber(f)} Hz` }));
  const width = damping.half_power_hz;
  const band = width === null ? [] : [{ data: { values: [{ f: width[0], to: width[1] }] }, mark: { type: 'rect', color: MARK, opacity: 0.18 }, encoding: { x, x2: { field: 'to' } } }];
  return {
    width: WIDTH,
    height: 300,
    layer: [
      ...band,
      { data: { values: points }, mark: { type: 'line', color: SOFT, strokeDash: [4, 3], strokeWidth: 1 }, encoding: { x, y: { ...y, field: 'b' } } },
      { data: { values: points }, mark: { type: 'line', color: LINE, strokeWidth: 1.4, interpolate: 'linear' }, encoding: { x, y } },
      { data: { values: [{ f: frequency_hz }] }, mark: { type: 'rule', color: MARK, strokeWidth: 1.2 }, encoding: { x } },
      {
        data: { values: [{ f: frequency_hz, s: top, text: `${formatNumber(frequency_hz, 4)} Hz, ${formatNumber(period_s, 3)} s` }] },
        mark: { type: 'text', align: 'left', dx: 6, dy: -6, color: MARK, fontSize: 12.5, fontWeight: 600, baseline: 'bottom' },
        encoding: { x, y, text: { field: 'text' } },
      },
      ...(others.length === 0
        ? []
        : [{ data: { values: others }, mark: { type: 'rule', color: SOFT, strokeWidth: 1, strokeDash: [1, 3] }, encoding: { x } }]),
    ],
  };
}

function decayChart({ decay }: Measurement, unit: string | null): unknown {
  if (decay === null) return {};
  const { filtered, peaks, whole, rate_hz, start_s } = decay;
  const first = peaks[0]?.time_s ?? 0;
  const end = (peaks.at(-1)?.time_s ?? 0) + 2 * whole.period_s;
  const every = Math.max(1, Math.floor(((end + 2 * whole.period_s) * rate_hz) / (2 * MOST_POINTS)));
  const trace: { t: number; v: number }[] = [];
  const from = Math.max(0, Math.floor((first - 2 * whole.period_s) * rate_hz));
  for (let i = from; i < Math.min(filtered.length, Math.ceil(end * rate_hz)); i += every) {
    trace.push({ t: start_s + i / rate_hz, v: filtered[i] ?? 0 });
  }
  const envelope = Array.from({ length: 60 }, (_, i) => {
    const cycles = (whole.cycles * i) / 59;
    const a = whole.first_amplitude * Math.exp(-whole.log_decrement * cycles);
    return { t: start_s + first + cycles * whole.period_s, up: a, down: -a };
  });
  const dots = peaks.map(({ time_s }) => ({ t: start_s + time_s, v: filtered[Math.round(time_s * rate_hz)] ?? 0 }));
  const x = { field: 't', type: 'quantitative', title: 'Time (s)', scale: { zero: false, nice: false } };
  const y = (field: string): unknown => ({ field, type: 'quantitative', title: `Filtered around the peak (${unit ?? 'unit'})` });
  const curve = { type: 'line', color: MARK, strokeWidth: 1.2, strokeDash: [4, 3] };
  return {
    width: WIDTH,
    height: 200,
    layer: [
      { data: { values: trace }, mark: { type: 'line', color: LINE, strokeWidth: 1 }, encoding: { x, y: y('v') } },
      { data: { values: envelope }, mark: curve, encoding: { x, y: y('up') } },
      { data: { values: envelope }, mark: curve, encoding: { x, y: y('down') } },
      { data: { values: dots }, mark: { type: 'point', color: MARK, size: 22, filled: true }, encoding: { x, y: y('v') } },
    ],
  };
}
