import { describe, expect, it } from 'vitest';
import { assess, isRanked } from '../../../src/engineering/assess/assess.js';
import { keptCapacity } from '../../../src/engineering/assess/capacity.js';
import { casesOf } from '../../../src/engineering/assess/cases.js';
import { detailingOf, eraChances, eras } from '../../../src/engineering/assess/code-history.js';
import { compileContext } from '../../../src/engineering/assess/context.js';
import type { CodeHistorySettings } from '../../../src/engineering/assess/settings.js';
import type { Building } from '../../../src/engineering/building.js';
import type { OwnEra } from '../../../src/engineering/capacity/own-table.js';
import { editionWords } from '../../../src/engineering/format.js';
import { Trace } from '../../../src/engineering/trace.js';
import { building, given } from '../../support/engineering-building.js';
import { SETTINGS } from '../../support/engineering-settings.js';

const history = (table: readonly OwnEra[], fields: Partial<CodeHistorySettings> = {}): CodeHistorySettings => ({
  place: 'invented',
  family: 'own-table',
  seismic_design_enforced_from: 1900,
  adoption_lag_years: 2,
  editions: {},
  table,
  ...fields,
});

/** Strength coefficient of the likeliest case. */
function strengthOf(settings: CodeHistorySettings, fields: Partial<Building>): number {
  const context = compileContext({ ...SETTINGS, codeHistory: settings });
  const one = building(fields);
  const cases = casesOf(one, context);
  if (typeof cases === 'string') throw new Error(cases);
  return keptCapacity(one, cases.list[0]!, 'longitudinal', one.height_m.value, context).strength_coefficient;
}

const TABLE: readonly OwnEra[] = [
  { from_year: 1950, level: 'working', coefficient: 0.05 },
  { from_year: 1975, level: 'working', by_system: { 'concrete-moment-frame': 0.07 }, coefficient: 0.1 },
  {
    from_year: 1998,
    level: 'strength',
    by_system: { 'concrete-moment-frame': 0.2 },
    period: { coefficient: 0.05, exponent: 0.75, corner_s: 0.4, fall: 1 },
  },
];

describe('ownEditions', () => {
  it('make eras with lag and mixtures like any other', () => {
    const list = eras(history(TABLE));
    expect(list.map(({ edition, from }) => [edition, from])).toEqual([
      [null, -Infinity],
      ['own-1', 1952],
      ['own-2', 1977],
      ['own-3', 2000],
    ]);
    expect(eraChances(list, 1977, 3).map(({ chance }) => chance)).toEqual([0.5, 0.5]);
  });

  it('take the coefficient of the system, else that of all others, at its level', () => {
    expect(strengthOf(history(TABLE), { years: [1960] })).toBeCloseTo(0.05 * 1.4, 12);
    expect(strengthOf(history(TABLE), { years: [1985] })).toBeCloseTo(0.07 * 1.4, 12);
    expect(strengthOf(history(TABLE), { years: [1985], system: 'concrete-shear-wall' })).toBeCloseTo(0.14, 12);
  });

  it('fall with their own period beyond their own corner', () => {
    // 0.05 × 16^(3/4) = 0.4 s; 0.05 × 81^(3/4) = 1.35 s
    expect(strengthOf(history(TABLE), { years: [2010], height_m: given(16) })).toBeCloseTo(0.2, 9);
    expect(strengthOf(history(TABLE), { years: [2010], height_m: given(81) })).toBeCloseTo((0.2 * 0.4) / 1.35, 9);
  });

  it('count a system without a coefficient as not designed, and say so', () => {
    expect(strengthOf(history(TABLE), { years: [2010], system: 'timber-light-frame' })).toBe(0.04);
    const trace = new Trace();
    const context = compileContext({ ...SETTINGS, codeHistory: history(TABLE) });
    const result = assess(building({ years: [2010], system: 'timber-light-frame' }), context, trace);
    expect(isRanked(result)).toBe(true);
    expect(trace.steps.some((step) => step.kind === 'choice' && step.taken === 'none: counts as not designed')).toBe(
      true,
    );
  });

  it('know no ductile detailing but what the study states', () => {
    expect(detailingOf('concrete-moment-frame', 'own-3', history(TABLE))).toBe('before');
    const dated = history(TABLE, { detailing_from: { 'concrete-moment-frame': 1998 } });
    expect(detailingOf('concrete-moment-frame', 'own-3', dated)).toBe('after');
    expect(detailingOf('concrete-moment-frame', 'own-2', dated)).toBe('before');
  });

  it('keep a table of two years apart: what one history found does not serve another', () => {
    const other = TABLE.map((era) => ({ ...era, coefficient: 0.2 }));
    expect(strengthOf(history(other), { years: [1960] })).toBeCloseTo(0.28, 12);
    expect(strengthOf(history(TABLE), { years: [1960] })).toBeCloseTo(0.07, 12);
  });
});

describe('editionWords', () => {
  it('tells editions and rows of a table in words', () => {
    expect(editionWords('italy-1975')).toBe('Italian code of 1975');
    expect(editionWords('own-3')).toBe("the study's own code, row 3");
    expect(editionWords('asce7-2002')).toBe('ASCE 7 of 2002');
    expect(editionWords('no seismic design')).toBe('no seismic design');
  });
});
