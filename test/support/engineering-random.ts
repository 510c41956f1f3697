/** Seeded random numbers for tests, independent of the generator under test: a 32-bit multiply-and-shift hash of a counter. */
export interface Random {
  /** Uniform in [0, 1). */
  readonly uniform: () => number;
  /** Standard normal (Box and Muller, 1958). */
  readonly normal: () => number;
}

export function random(seed: number): Random {
  let [a, b, c, counter] = [seed | 0, 0x9e3779b9, 0x243f6a88, 1];
  // sfc32: chaotic part of 96 bits, counter of 32 (from memory); passes the usual batteries of tests
  const word = (): number => {
    const t = (((a + b) | 0) + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (((c << 21) | (c >>> 11)) + t) | 0;
    return t >>> 0;
  };
  for (let i = 0; i < 20; i += 1) word();
  const uniform = (): number => word() / 4294967296;
  let spare = NaN;
  const normal = (): number => {
    if (!Number.isNaN(spare)) {
      const value = spare;
      spare = NaN;
      return value;
    }
    const radius = Math.sqrt(-2 * Math.log((word() + 0.5) / 4294967296));
    const angle = 2 * Math.PI * uniform();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
  return { uniform, normal };
}
