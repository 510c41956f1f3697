// Seeded draws built from exact arithmetic only (+ - * / %, floor, round, sqrt), so that every Node version writes the same bytes.

/** Minimal-standard congruential generator: the product stays below 2^53, so each step is exact. */
export function makeRandom(seed) {
  let state = seed % 2147483647;
  const next = () => {
    state = (state * 48271) % 2147483647;
    return (state - 1) / 2147483646;
  };
  for (let i = 0; i < 20; i += 1) next();
  const between = (low, high) => low + (high - low) * next();
  const whole = (low, high) => low + Math.floor(next() * (high - low + 1 - 1e-9));
  const chance = (p) => next() < p;
  const pick = (list) => list[whole(0, list.length - 1)];
  const weighted = (pairs) => {
    let total = 0;
    for (const [, weight] of pairs) total += weight;
    let left = next() * total;
    for (const [value, weight] of pairs) {
      left -= weight;
      if (left < 0) return value;
    }
    return pairs[pairs.length - 1][0];
  };
  // Sum of twelve uniforms: near enough to normal, cut at two standard deviations so that no draw is absurd.
  const normal = () => {
    let sum = -6;
    for (let i = 0; i < 12; i += 1) sum += next();
    return sum < -2 ? -2 : sum > 2 ? 2 : sum;
  };
  const shuffle = (list) => {
    const out = list.slice();
    for (let i = out.length - 1; i > 0; i -= 1) {
      const j = whole(0, i);
      [out[i], out[j]] = [out[j], out[i]];
    }
    return out;
  };
  return { next, between, whole, chance, pick, weighted, normal, shuffle };
}

/** Fifth root by Newton's rule with a fixed number of steps. */
export function fifthRoot(x) {
  let y = x > 1 ? Math.sqrt(Math.sqrt(x)) : 1;
  for (let i = 0; i < 60; i += 1) y -= (y - x / (y * y * y * y)) / 5;
  return y;
}

/** Round to `digits` decimals. */
export function roundTo(x, digits) {
  let scale = 1;
  for (let i = 0; i < digits; i += 1) scale *= 10;
  return Math.round(x * scale) / scale;
}
