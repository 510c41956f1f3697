/** Conditions an ambient record should meet before its peak is believed. */

export interface Condition {
  readonly name: string;
  /** What is asked. */
  readonly asks: string;
  readonly value: number;
  readonly met: boolean;
  readonly source: string;
}

const SOURCE = 'SESAME guidelines 2004, from memory';
const CYCLES_IN_WINDOW = 10;
const CYCLES_IN_ALL = 200;
const MOST_SCATTER = 2;

/** The three conditions for a peak at `frequency_hz`; windows overlap, so that the time they cover stands for number times length. */
export function recordConditions(
  frequency_hz: number,
  spectrum: { readonly window_s: number; readonly covered_s: number; readonly scatter: number },
): readonly Condition[] {
  const inWindow = frequency_hz * spectrum.window_s;
  const inAll = frequency_hz * spectrum.covered_s;
  return [
    {
      name: 'cycles in a window',
      asks: `more than ${String(CYCLES_IN_WINDOW)}`,
      value: inWindow,
      met: inWindow > CYCLES_IN_WINDOW,
      source: SOURCE,
    },
    {
      name: 'cycles in all windows',
      asks: `more than ${String(CYCLES_IN_ALL)}`,
      value: inAll,
      met: inAll > CYCLES_IN_ALL,
      source: SOURCE,
    },
    {
      name: 'scatter of amplitudes, f/2 to 2f',
      asks: `a factor under ${String(MOST_SCATTER)}`,
      value: spectrum.scatter,
      met: spectrum.scatter < MOST_SCATTER,
      source: SOURCE,
    },
  ];
}
