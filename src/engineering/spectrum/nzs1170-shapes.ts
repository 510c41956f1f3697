/** NZS 1170.5:2004 spectral shape factors C_h(T): closed forms of the commentary, and table 3.1. */
import { power } from '../numeric/power.js';
import type { Segment, Term } from './compiled.js';

export const CLASSES = ['A', 'B', 'C', 'D', 'E'] as const;
export type SoilClass = (typeof CLASSES)[number];

interface Shape {
  /** Modal form: value at 0 s and rise per 0.1 s; C_h reaches the plateau at 0.1 s. */
  readonly start: number;
  readonly rise: number;
  readonly plateau: number;
  /** End of the plateau as printed, s. */
  readonly end_s: number;
  /** a (b/T)^0.75 up to 1.5 s. */
  readonly power: readonly [number, number];
  /** /T up to 3 s, /T² beyond. */
  readonly velocity: number;
  readonly displacement: number;
  /** Equivalent static form. */
  readonly staticPlateau: number;
  readonly staticEnd_s: number;
}

const ROCK: Shape = {
  start: 1,
  rise: 1.35,
  plateau: 2.35,
  end_s: 0.3,
  power: [1.6, 0.5],
  velocity: 1.05,
  displacement: 3.15,
  staticPlateau: 1.89,
  staticEnd_s: 0.4,
};

/** 9.96 for class E beyond 3 s: one public file has 9.66, continuity with 3.32/T fixes 9.96. */
export const SHAPES: Readonly<Record<SoilClass, Shape>> = {
  A: ROCK,
  B: ROCK,
  C: {
    start: 1.33,
    rise: 1.6,
    plateau: 2.93,
    end_s: 0.3,
    power: [2.0, 0.5],
    velocity: 1.32,
    displacement: 3.96,
    staticPlateau: 2.36,
    staticEnd_s: 0.4,
  },
  D: {
    start: 1.12,
    rise: 1.88,
    plateau: 3.0,
    end_s: 0.56,
    power: [2.4, 0.75],
    velocity: 2.14,
    displacement: 6.42,
    staticPlateau: 3.0,
    staticEnd_s: 0.56,
  },
  E: {
    start: 1.12,
    rise: 1.88,
    plateau: 3.0,
    end_s: 1.0,
    power: [3.0, 1.0],
    velocity: 3.32,
    displacement: 9.96,
    staticPlateau: 3.0,
    staticEnd_s: 1.0,
  },
};

export const TABLE_PERIODS_S: readonly number[] = [
  0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1.0, 1.5, 2.0, 2.5, 3.0, 3.5, 4.0, 4.5,
];
const ROCK_ROW = [
  1.89, 1.89, 1.89, 1.89, 1.89, 1.6, 1.4, 1.24, 1.12, 1.03, 0.95, 0.7, 0.53, 0.42, 0.35, 0.26, 0.2, 0.16,
];
/** Table 3.1, equivalent static column. */
export const TABLE_ROWS: Readonly<Record<SoilClass, readonly number[]>> = {
  A: ROCK_ROW,
  B: ROCK_ROW,
  C: [2.36, 2.36, 2.36, 2.36, 2.36, 2.0, 1.74, 1.55, 1.41, 1.29, 1.19, 0.88, 0.66, 0.53, 0.44, 0.32, 0.25, 0.2],
  D: [3, 3, 3, 3, 3, 3, 2.84, 2.53, 2.29, 2.09, 1.93, 1.43, 1.07, 0.86, 0.71, 0.52, 0.4, 0.32],
  E: [3, 3, 3, 3, 3, 3, 3, 3, 3, 3, 3, 2.21, 1.66, 1.33, 1.11, 0.81, 0.62, 0.49],
};

/** A segment without `over`, expression in the same names. */
export type Piece = Omit<Segment, 'over'>;

const piece = (
  from_s: number,
  to_s: number,
  terms: readonly Term[],
  expression: string,
  clause: string,
): readonly Piece[] => (to_s > from_s ? [{ from_s, to_s, terms, clause, expression }] : []);

const n = (value: number): string => String(value);

/** The falling branches from `from_s` on, times `scale`. */
function falling(shape: Shape, from_s: number, scale: number, by: string): readonly Piece[] {
  const [a, b] = shape.power;
  return [
    ...piece(
      from_s,
      1.5,
      [{ coefficient: a * power(b, 0.75) * scale, exponent: -0.75 }],
      `${n(a)} * (${n(b)} / period_s) ^ 0.75${by}`,
      `C_h = ${n(a)} (${n(b)}/T)^0.75`,
    ),
    ...piece(
      1.5,
      3,
      [{ coefficient: shape.velocity * scale, exponent: -1 }],
      `${n(shape.velocity)} / period_s${by}`,
      `C_h = ${n(shape.velocity)}/T`,
    ),
    ...piece(
      3,
      Infinity,
      [{ coefficient: shape.displacement * scale, exponent: -2 }],
      `${n(shape.displacement)} / period_s ^ 2${by}`,
      `C_h = ${n(shape.displacement)}/T²`,
    ),
  ];
}

/** Modal response spectrum and time history form, commentary C3.1. */
export function modalShape(soil: SoilClass): readonly Piece[] {
  const shape = SHAPES[soil];
  return [
    ...piece(
      0,
      0.1,
      [
        { coefficient: shape.start, exponent: 0 },
        { coefficient: shape.rise / 0.1, exponent: 1 },
      ],
      `(${n(shape.start)} + ${n(shape.rise)} * period_s / 0.1)`,
      `C_h = ${n(shape.start)} + ${n(shape.rise)} (T/0.1)`,
    ),
    ...piece(0.1, shape.end_s, [{ coefficient: shape.plateau, exponent: 0 }], n(shape.plateau), 'plateau of C_h'),
    ...falling(shape, shape.end_s, 1, ''),
  ];
}

/**
 * Equivalent static form: the plateau from 0 s, the branches held to it. A deep site of class D with `site_period_s` below 1.5 s
 * takes the shape of class C times 1 + 0.5 (T_site - 0.25), held to 3.0.
 */
export function staticShape(
  soil: SoilClass,
  site_period_s: number,
): { readonly pieces: readonly Piece[]; readonly end_s: number } {
  const between = soil === 'D' && site_period_s < 1.5;
  const shape = SHAPES[between ? 'C' : soil];
  const scale = between ? 1 + 0.5 * (site_period_s - 0.25) : 1;
  const by = between ? ' * (1 + 0.5 * (site_period_s - 0.25))' : '';
  const top = Math.min(shape.staticPlateau * scale, between ? 3 : Infinity);
  const written = between ? `min(${n(shape.staticPlateau)}${by}, 3)` : n(top);
  const [a, b] = shape.power;
  // where the power branch comes down to the plateau, if that is beyond its printed end
  const met = b * power((a * scale) / top, 1 / 0.75);
  const end_s = Math.max(shape.staticEnd_s, met);
  return {
    pieces: [
      ...piece(0, end_s, [{ coefficient: top, exponent: 0 }], written, 'plateau of C_h'),
      ...falling(shape, end_s, scale, by),
    ],
    end_s,
  };
}

/** Table 3.1 with straight lines; beyond 4.5 s its last value falls with T². */
export function tableShape(soil: SoilClass): readonly Piece[] {
  const row = TABLE_ROWS[soil];
  const lines = TABLE_PERIODS_S.slice(1).flatMap((to, i) => {
    const [from, a, b] = [TABLE_PERIODS_S[i]!, row[i]!, row[i + 1]!];
    const slope = (b - a) / (to - from);
    return piece(
      from,
      to,
      [
        { coefficient: a - slope * from, exponent: 0 },
        { coefficient: slope, exponent: 1 },
      ],
      a === b ? n(a) : `(${n(a)} + (${n(b)} - ${n(a)}) * (period_s - ${n(from)}) / (${n(to)} - ${n(from)}))`,
      `table 3.1 between ${n(from)} s and ${n(to)} s`,
    );
  });
  const last = row.at(-1)!;
  return [
    ...lines,
    ...piece(
      4.5,
      Infinity,
      [{ coefficient: last * 4.5 * 4.5, exponent: -2 }],
      `${n(last)} * (4.5 / period_s) ^ 2`,
      'beyond table 3.1: its last value over T²',
    ),
  ];
}
