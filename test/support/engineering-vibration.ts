/** Vibration of known period and damping: a single mass, as the exact recursion of its free vibration. */
import type { Gap, Signal } from '../../src/engineering/vibration/signal.js';
import { random } from './engineering-random.js';

export interface Mode {
  readonly frequency_hz: number;
  readonly damping: number;
}

/** Free decay from `amplitude` at `start_s`, as a cosine; nothing before. `frequency_hz` is that of the damped vibration. */
export function decayOf(
  { frequency_hz, damping }: Mode,
  rate_hz: number,
  samples: number,
  start_s = 0,
  amplitude = 1,
): Float64Array {
  const damped = 2 * Math.PI * frequency_hz;
  const rate = (damping * damped) / Math.sqrt(1 - damping * damping);
  return Float64Array.from({ length: samples }, (_, i) => {
    const t = i / rate_hz - start_s;
    return t < 0 ? 0 : amplitude * Math.exp(-rate * t) * Math.cos(damped * t);
  });
}

/**
 * Ambient vibration: x[n] = 2 e^(-ζωh) cos(ω_d h) x[n-1] - e^(-2ζωh) x[n-2] + noise, whose poles are those of the single mass exactly;
 * begun long before the first sample, and brought to unit variance.
 */
export function ambientOf(
  { frequency_hz, damping }: Mode,
  rate_hz: number,
  samples: number,
  seed: number,
): Float64Array {
  const omega = (2 * Math.PI * frequency_hz) / rate_hz;
  const one = 2 * Math.exp(-damping * omega) * Math.cos(omega * Math.sqrt(1 - damping * damping));
  const two = -Math.exp(-2 * damping * omega);
  // variance of a second-order recursion driven by unit noise
  const scale = Math.sqrt(((1 + two) * ((1 - two) ** 2 - one * one)) / (1 - two));
  const { normal } = random(seed);
  const values = new Float64Array(samples);
  let [last, before] = [0, 0];
  for (let i = -Math.ceil(20 / (damping * omega)); i < samples; i += 1) {
    [last, before] = [one * last + two * before + normal(), last];
    if (i >= 0) values[i] = scale * last;
  }
  return values;
}

export function noiseOf(samples: number, seed: number, size = 1): Float64Array {
  const { normal } = random(seed);
  return Float64Array.from({ length: samples }, () => size * normal());
}

/** The sum of signals of one length. */
export function sumOf(...parts: readonly Float64Array[]): Float64Array {
  return parts.reduce((a, b) => a.map((value, i) => value + b[i]!));
}

export function signalOf(values: Float64Array, rate_hz: number, gaps: readonly Gap[] = []): Signal {
  return { values, rate_hz, gaps };
}
