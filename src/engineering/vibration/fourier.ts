/** The one place that knows the Fourier library. */
import FFT from 'fft.js';

interface Plan {
  realTransform(out: Float64Array, data: Float64Array): void;
  completeSpectrum(spectrum: Float64Array): void;
  inverseTransform(out: Float64Array, data: Float64Array): void;
}

const Transform = FFT as unknown as new (size: number) => Plan;

/** The least power of two that is at least `n`. */
export function powerOfTwo(n: number): number {
  let size = 2;
  while (size < n) size *= 2;
  return size;
}

/** Squared Fourier magnitudes of real data: `size` (a power of two) values in, `size / 2 + 1` out. */
export function squaredMagnitudes(size: number): (data: Float64Array, out: Float64Array) => void {
  const plan = new Transform(size);
  const spectrum = new Float64Array(2 * size);
  return (data, out) => {
    plan.realTransform(spectrum, data);
    for (let k = 0; k <= size / 2; k += 1) {
      const [re, im] = [spectrum[2 * k]!, spectrum[2 * k + 1]!];
      out[k] = re * re + im * im;
    }
  };
}

/** Real data with every frequency multiplied by `gain` of its share of the sampling rate (0 to 0.5): no phase is moved. */
export function filtered(data: Float64Array, gain: (share: number) => number): Float64Array {
  const size = powerOfTwo(data.length);
  const plan = new Transform(size);
  const padded = new Float64Array(size);
  padded.set(data);
  const spectrum = new Float64Array(2 * size);
  plan.realTransform(spectrum, padded);
  for (let k = 0; k <= size / 2; k += 1) {
    const factor = gain(k / size);
    spectrum[2 * k]! *= factor;
    spectrum[2 * k + 1]! *= factor;
  }
  plan.completeSpectrum(spectrum);
  const back = new Float64Array(2 * size);
  plan.inverseTransform(back, spectrum);
  return padded.map((_, i) => back[2 * i]!).subarray(0, data.length);
}
