/** Site class from the mean shear-wave velocity of the upper 30 m, by code. Letters do not carry from one code to another. */

/** One class: it holds velocities above `above_mps`, up to and with the lower bound of the class before it. */
export interface VelocityClass {
  readonly site_class: string;
  readonly above_mps: number;
}

export interface VelocityTable {
  readonly source: string;
  readonly verified: 'restated' | 'memory';
  /** Stiffest first; the last has no lower bound. */
  readonly classes: readonly VelocityClass[];
}

const FOOT_M = 0.3048;

const classes = (...rows: readonly (readonly [string, number])[]): readonly VelocityClass[] =>
  rows.map(([site_class, above_mps]) => ({ site_class, above_mps }));

/**
 * Velocity classes. 7-16: bounds in m/s as printed beside those in ft/s. 7-22: printed in ft/s, the upper bound belongs to the class
 * (B is 3000 < v ≤ 5000). Class E by soft clay, F, and the special grounds of EN 1998-1 (E, S1, S2) cannot be told from a velocity.
 */
export const VS30_TABLES: Readonly<
  Record<'asce7-16' | 'asce7-22' | 'en1998-1-2004' | 'nbc-2020' | 'tbdy-2018', VelocityTable>
> = {
  'asce7-16': {
    source: 'ASCE/SEI 7-16, table 20.3-1; the same bounds in 7-05 and 7-10',
    verified: 'restated',
    classes: classes(['A', 1500], ['B', 760], ['C', 360], ['D', 180], ['E', 0]),
  },
  'asce7-22': {
    source: 'ASCE/SEI 7-22, table 20.2-1',
    verified: 'restated',
    classes: classes(
      ['A', 5000 * FOOT_M],
      ['B', 3000 * FOOT_M],
      ['BC', 2100 * FOOT_M],
      ['C', 1450 * FOOT_M],
      ['CD', 1000 * FOOT_M],
      ['D', 700 * FOOT_M],
      ['DE', 500 * FOOT_M],
      ['E', 0],
    ),
  },
  'en1998-1-2004': {
    source: 'EN 1998-1:2004, table 3.1',
    verified: 'memory',
    classes: classes(['A', 800], ['B', 360], ['C', 180], ['D', 0]),
  },
  'nbc-2020': {
    source: 'NBC 2020, 4.1.8.4',
    verified: 'restated',
    classes: classes(['A', 1500], ['B', 760], ['C', 360], ['D', 180], ['E', 140], ['F', 0]),
  },
  'tbdy-2018': {
    source: 'TBDY 2018, table 16.1',
    verified: 'restated',
    classes: classes(['ZA', 1500], ['ZB', 760], ['ZC', 360], ['ZD', 180], ['ZE', 0]),
  },
};

export type VelocityCode = keyof typeof VS30_TABLES;

/** The site class of `code` at `vs30_mps`. @throws RangeError for a velocity that is not above 0. */
export function siteClassFromVs30(code: VelocityCode, vs30_mps: number): string {
  if (!(vs30_mps > 0)) throw new RangeError(`a shear-wave velocity above 0 m/s is needed, got ${String(vs30_mps)}`);
  return VS30_TABLES[code].classes.find(({ above_mps }) => vs30_mps > above_mps)!.site_class;
}
