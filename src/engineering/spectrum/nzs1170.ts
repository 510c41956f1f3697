/** NZS 1170.5:2004 elastic site spectrum C(T) = C_h(T) Z R N(T, D), Z R at most 0.7, 3.1.1. */
import { record } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import type { Verified } from '../source.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum, Segment } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { PERIOD_INPUT } from './family.js';
import { DISTANCE_INPUT, nearFaultLines, nearFaultShare, RETURN_INPUT, SHARE_TEXT } from './nzs1170-factors.js';
import type { Line } from './nzs1170-factors.js';
import { CLASSES, modalShape, SHAPES, staticShape, tableShape } from './nzs1170-shapes.js';
import type { Piece, SoilClass } from './nzs1170-shapes.js';

interface SiteInput {
  readonly site_class: string;
  readonly zone_factor: number;
  readonly return_factor: number;
  readonly distance_km: number;
  readonly site_period_s: number;
  readonly period_s: number;
}

type Form = 'modal' | 'equivalent-static' | 'table-3-1';

/** Every piece of the shape cut at the corners of N and multiplied by it and by `scale`. */
function product(pieces: readonly Piece[], lines: readonly Line[], scale: number, written: string): readonly Segment[] {
  return pieces.flatMap((piece) =>
    lines.flatMap((line): readonly Segment[] => {
      const from_s = Math.max(piece.from_s, line.from_s);
      const to_s = Math.min(piece.to_s, line.to_s);
      if (!(to_s > from_s)) return [];
      const byExponent = new Map<number, number>();
      const add = (exponent: number, coefficient: number): void => {
        if (coefficient !== 0) byExponent.set(exponent, (byExponent.get(exponent) ?? 0) + coefficient);
      };
      for (const { coefficient, exponent } of piece.terms) {
        add(exponent, coefficient * line.constant * scale);
        add(exponent + 1, coefficient * line.slope * scale);
      }
      const one = line.shown.expression === '1';
      return [
        {
          from_s,
          to_s,
          terms: [...byExponent].map(([exponent, coefficient]) => ({ coefficient, exponent })),
          clause: one ? piece.clause : `${piece.clause}, ${line.shown.clause}`,
          expression: `${piece.expression} * ${written}${one ? '' : ` * ${line.shown.expression}`}`,
        },
      ];
    }),
  );
}

function compileSite(form: Form, input: Omit<SiteInput, 'period_s'>): CompiledSpectrum {
  const { site_class, zone_factor, return_factor, distance_km, site_period_s } = input;
  if (!(CLASSES as readonly string[]).includes(site_class))
    throw new RangeError(`unknown site_class "${site_class}"; known: ${CLASSES.join(', ')}`);
  const soil = site_class as SoilClass;
  if (form !== 'equivalent-static' && site_period_s < 1.5)
    throw new RangeError(
      'a site period below 1.5 s changes the equivalent static form only: use that form, or leave it out',
    );
  if (soil !== 'D' && site_period_s < 1.5)
    throw new RangeError(`a site period below 1.5 s belongs to class D, not ${soil}: leave it out`);
  const still = form === 'equivalent-static' ? staticShape(soil, site_period_s) : null;
  const pieces = still?.pieces ?? (form === 'modal' ? modalShape(soil) : tableShape(soil));
  const lines = nearFaultLines(nearFaultShare(distance_km, return_factor), SHARE_TEXT);
  const scale = Math.min(zone_factor * return_factor, 0.7);
  return {
    segments: product(pieces, lines, scale, 'min(zone_factor * return_factor, 0.7)'),
    plateau_from_s: form === 'modal' ? 0.1 : 0,
    plateau_to_s: still?.end_s ?? SHAPES[soil][form === 'modal' ? 'end_s' : 'staticEnd_s'],
    valid_to_s: form === 'table-3-1' ? 4.5 : Infinity,
    flags: zone_factor * return_factor > 0.7 ? ['zone-return-limit'] : [],
  };
}

const PROCEDURES: Readonly<Record<Form, string>> = {
  modal: 'C(T) = C_h(T) Z R N(T, D), Z R at most 0.7; C_h by the closed forms with the rise below 0.1 s',
  'equivalent-static':
    'C(T) = C_h(T) Z R N(T, D), Z R at most 0.7; C_h by the closed forms, held to the plateau from 0 s; class D with a site period T_site: class C times 1 + 0.5 (T_site - 0.25), at most 3.0',
  'table-3-1': 'C(T) = C_h(T) Z R N(T, D), Z R at most 0.7; C_h from table 3.1, straight lines between its periods',
};

function siteRecord(form: Form, title: string, clause: string, verified: Verified, note: string): AnyRecord {
  const compile = (input: Omit<SiteInput, 'period_s'>): CompiledSpectrum => compileSite(form, input);
  const family: SpectrumFamily<SiteInput> = {
    id: `spectrum/nzs1170-5-${form}`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'C(T)',
    inputs: [
      { name: 'site_class', kind: 'word', words: CLASSES, meaning: 'site subsoil class' },
      { name: 'zone_factor', kind: 'number', from: 0.05, to: 1, meaning: 'hazard factor Z' },
      RETURN_INPUT,
      DISTANCE_INPUT,
      {
        name: 'site_period_s',
        kind: 'number',
        unit: 's',
        from: 0.6,
        to: 1.5,
        fallback: 1.5,
        meaning: 'period of a class D site between C and D (equivalent static form); 1.5 is class D itself',
      },
      PERIOD_INPUT,
    ],
    expression: null,
    procedure: PROCEDURES[form],
    compile,
    evaluate: (input) => ordinate(compile(input), input.period_s),
  };
  return record({
    id: `nzs1170-5-2004/spectrum/${form}`,
    title,
    family,
    constants: {},
    source: { standard: 'NZS 1170.5', edition: '2004', clause },
    verified,
    limits: [],
    note,
  });
}

const MODAL = siteRecord(
  'modal',
  'Elastic site spectrum, modal form',
  '3.1.1 and commentary C3.1.2',
  'restated',
  'The closed forms step by up to 0.4 % where branches meet, as printed.',
);

export const NZS1170_CODES: readonly SpectrumCode[] = [
  {
    code: 'nzs1170-5-2004',
    title: 'NZS 1170.5:2004 elastic site spectrum',
    record: MODAL,
    choice: {
      name: 'form',
      meaning: 'shape factor: closed forms for modal analysis, for the equivalent static method, or table 3.1',
      fallback: 'modal',
      records: {
        modal: MODAL,
        'equivalent-static': siteRecord(
          'equivalent-static',
          'Elastic site spectrum, equivalent static form',
          '3.1.1 and commentary C3.1.2',
          'restated',
          'The closed forms step by up to 0.4 % where branches meet, as printed.',
        ),
        'table-3-1': siteRecord(
          'table-3-1',
          'Elastic site spectrum, table 3.1',
          '3.1.1, table 3.1',
          'memory',
          'The row of class C was found restated; the others are from memory and equal the closed forms rounded.',
        ),
      },
    },
  },
];
