/** Round values for axes. */

/** Values from 0 up to `to` at a round step, about `wanted` of them. */
export function roundSteps(to: number, wanted = 6): readonly number[] {
  const raw = to / wanted;
  const size = 10 ** Math.floor(Math.log10(raw));
  const step = size * ([1, 2, 2.5, 5, 10].find((factor) => factor * size >= raw) ?? 10);
  return Array.from({ length: Math.floor(to / step + 1e-9) + 1 }, (_, i) => Number((i * step).toPrecision(6)));
}

/** 1, 2, 5 and their tenfolds within `from` to `to`. */
export function logSteps(from: number, to: number): readonly number[] {
  const values: number[] = [];
  for (let decade = Math.floor(Math.log10(from)); decade <= Math.ceil(Math.log10(to)); decade += 1) {
    for (const factor of [1, 2, 5]) {
      const value = Number((factor * 10 ** decade).toPrecision(3));
      if (value >= from * 0.999 && value <= to * 1.001) values.push(value);
    }
  }
  return values;
}
