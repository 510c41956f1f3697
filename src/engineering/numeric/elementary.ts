/**
 * exp, ln and sin from additions, multiplications and divisions alone, which IEEE 754 rounds the same everywhere. The language's own
 * differ in the last bit between engines (Node and Chromium in one value of ten), and a value stored by one would not equal the value
 * the page computes. Accurate to about two units in the last place, which is far inside any need here.
 */

/** ln 2 in two parts: the first has trailing zeros enough for an exact product with any exponent. */
const LN2_HIGH = 0.69314718036912381649;
const LN2_LOW = 1.90821492927058770002e-10;
const LOG2_E = 1.4426950408889634;
const ROOT_TWO = 1.4142135623730951;

/** 2^n for n from -1074 to 1023, each an exact halving or doubling of its neighbour. */
const LEAST = -1074;
const POWERS = ((): Float64Array => {
  const powers = new Float64Array(1023 - LEAST + 1);
  powers[-LEAST] = 1;
  for (let n = 1; n <= 1023; n += 1) powers[n - LEAST] = powers[n - 1 - LEAST]! * 2;
  for (let n = -1; n >= LEAST; n -= 1) powers[n - LEAST] = powers[n + 1 - LEAST]! / 2;
  return powers;
})();

/** 1/k! for k from 0 to 14. */
const INVERSE_FACTORIALS = ((): readonly number[] => {
  const list = [1];
  let factorial = 1;
  for (let k = 1; k <= 14; k += 1) {
    factorial *= k;
    list.push(1 / factorial);
  }
  return list;
})();
const [, , C2, C3, C4, C5, C6, C7, C8, C9, C10, C11, C12, C13, C14] = INVERSE_FACTORIALS as readonly [
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
];

/** e^x: x = n ln 2 + r, the series of e^r to r^14 (|r| at most 0.35), times 2^n. Infinity above 709.78, 0 below -745.2. */
export function exp(x: number): number {
  if (x !== x) return x;
  if (x > 709.782712893384) return Infinity;
  if (x < -745.1332191019412) return 0;
  const n = Math.round(x * LOG2_E);
  const r = x - n * LN2_HIGH - n * LN2_LOW;
  const tail =
    C2 +
    r *
      (C3 +
        r *
          (C4 +
            r *
              (C5 +
                r * (C6 + r * (C7 + r * (C8 + r * (C9 + r * (C10 + r * (C11 + r * (C12 + r * (C13 + r * C14)))))))))));
  const value = 1 + (r + r * r * tail);
  if (n < LEAST) return 0.5 * value * POWERS[0]!;
  return n > 1023 ? value * 2 * POWERS[1023 - LEAST]! : value * POWERS[n - LEAST]!;
}

const NUMBER = new Float64Array(1);
const HALVES = new Uint32Array(NUMBER.buffer);
/** Which half holds sign and exponent: the second on a little-endian machine. */
const UPPER = ((): 0 | 1 => {
  NUMBER[0] = 1;
  return HALVES[1] === 0x3ff00000 ? 1 : 0;
})();

/** 1/3, 1/5, … 1/23: the series of artanh. */
const [L3, L5, L7, L9, L11, L13, L15, L17, L19, L21, L23] = [
  1 / 3,
  1 / 5,
  1 / 7,
  1 / 9,
  1 / 11,
  1 / 13,
  1 / 15,
  1 / 17,
  1 / 19,
  1 / 21,
  1 / 23,
] as const;

/** Natural logarithm: x = m 2^e with m about 1, and ln m = 2 artanh((m - 1)/(m + 1)) by its series. -Infinity at 0, NaN below. */
export function ln(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return x;
  if (x < 2.2250738585072014e-308) return ln(x * 18014398509481984) - 54 * (LN2_HIGH + LN2_LOW);
  NUMBER[0] = x;
  let e = (HALVES[UPPER]! >>> 20) - 1023;
  // x over a power of two is exact
  let m = x * POWERS[-e - LEAST]!;
  if (m > ROOT_TWO) {
    m *= 0.5;
    e += 1;
  }
  const s = (m - 1) / (m + 1);
  const z = s * s;
  const tail =
    z *
    (L3 +
      z * (L5 + z * (L7 + z * (L9 + z * (L11 + z * (L13 + z * (L15 + z * (L17 + z * (L19 + z * (L21 + z * L23))))))))));
  return e * LN2_HIGH + (2 * s + (2 * s * tail + e * LN2_LOW));
}

/** sin x for 0 <= x <= π/2 by its series. @throws RangeError outside. */
export function sinOfAcute(x: number): number {
  if (!(x >= 0 && x <= 1.5707963267948968)) throw new RangeError(`an angle of 0 to π/2 is needed, got ${String(x)}`);
  const z = x * x;
  let sum = 1;
  for (let k = 23; k >= 3; k -= 2) sum = 1 - (z / (k * (k - 1))) * sum;
  return x * sum;
}

/** π/2 in three parts, the first two with trailing zeros enough for exact products with whole numbers to 2^20 (after fdlibm). */
const HALF_PI_HIGH = 1.57079632673412561417;
const HALF_PI_MIDDLE = 6.0771005063039659766e-11;
const HALF_PI_LOW = 2.02226624879595063154e-21;

/** sin r and cos r for |r| up to π/4 by their series. */
function sineSeries(r: number): number {
  const z = r * r;
  let sum = 1;
  for (let k = 19; k >= 3; k -= 2) sum = 1 - (z / (k * (k - 1))) * sum;
  return r * sum;
}
function cosineSeries(r: number): number {
  const z = r * r;
  let sum = 1;
  for (let k = 20; k >= 2; k -= 2) sum = 1 - (z / (k * (k - 1))) * sum;
  return sum;
}

/** sin(x + q π/2): x is brought to within π/4 of 0, which turns the quarter. */
function sineOfQuarter(x: number, q: number): number {
  if (!(Math.abs(x) <= 1e6)) throw new RangeError(`an angle within ±1,000,000 is needed, got ${String(x)}`);
  const n = Math.round(x / 1.5707963267948966);
  const r = x - n * HALF_PI_HIGH - n * HALF_PI_MIDDLE - n * HALF_PI_LOW;
  switch ((((n + q) % 4) + 4) % 4) {
    case 0:
      return sineSeries(r);
    case 1:
      return cosineSeries(r);
    case 2:
      return -sineSeries(r);
    default:
      return -cosineSeries(r);
  }
}

/** sin x, to about 2e-16 absolute. @throws RangeError beyond ±1,000,000. */
export function sine(x: number): number {
  return sineOfQuarter(x, 0);
}

/** cos x, to about 2e-16 absolute. @throws RangeError beyond ±1,000,000. */
export function cosine(x: number): number {
  return sineOfQuarter(x, 1);
}
