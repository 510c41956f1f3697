/** What is measured: one channel, evenly sampled but for its gaps. */
export interface Signal {
  readonly rate_hz: number;
  /** In the unit of the channel; NaN where the sample cannot be read. */
  readonly values: Float64Array;
  /** Samples in front of which others are missing, in order. */
  readonly gaps: readonly Gap[];
}

export interface Gap {
  readonly at: number;
  readonly missing_s: number;
}

/** Samples `from` to `to`, `to` left out. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

/** What was cut out of a record, and what is left. */
export interface Cuts {
  readonly samples: number;
  readonly unreadable: number;
  /** Samples of runs that repeat one value. */
  readonly flat: number;
  readonly gaps: number;
  readonly gap_s: number;
  readonly stretches: readonly Stretch[];
}

/** A run of one value as long as this is a dropout: an instrument that holds its last value, or zeros. Judgement. */
const FLAT_RUN = 20;

/** The stretches of a signal that hold neither gaps, unreadable samples nor flat runs, with the account of the rest. */
export function usableStretches({ values, gaps }: Signal): Cuts {
  const stretches: Stretch[] = [];
  let from = 0;
  let unreadable = 0;
  let flat = 0;
  let nextGap = 0;
  const close = (to: number): void => {
    if (to > from) stretches.push({ from, to });
  };
  for (let i = 0; i < values.length;) {
    if (gaps[nextGap]?.at === i) {
      nextGap += 1;
      close(i);
      from = i;
    }
    const value = values[i]!;
    const gapAt = gaps[nextGap]?.at ?? values.length;
    let end = i + 1;
    if (value !== value) {
      while (end < gapAt && values[end] !== values[end]) end += 1;
      unreadable += end - i;
      close(i);
      from = end;
    } else {
      while (end < gapAt && values[end] === value) end += 1;
      if (end - i >= FLAT_RUN) {
        flat += end - i;
        close(i);
        from = end;
      }
    }
    i = end;
  }
  close(values.length);
  const gap_s = gaps.reduce((sum, { missing_s }) => sum + missing_s, 0);
  return { samples: values.length, unreadable, flat, gaps: gaps.length, gap_s, stretches };
}
