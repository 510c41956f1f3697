import fc from 'fast-check';
import { parse, View } from 'vega';
import type { Spec } from 'vega';
import { expressionInterpreter } from 'vega-interpreter';
import { describe, expect, it } from 'vitest';
import { unpackColumn } from '../../../src/browser/unpack.js';
import type { PageData } from '../../../src/engineering/page-contract.js';
import type { Chart } from '../../../src/reports/dashboard/charts/chart.js';
import { compileChart } from '../../../src/reports/dashboard/charts/compile.js';
import { mapChart } from '../../../src/reports/dashboard/charts/map.js';
import { periodHeightChart } from '../../../src/reports/dashboard/charts/period-height.js';
import { provenanceChart } from '../../../src/reports/dashboard/charts/provenance.js';
import { rankedChart } from '../../../src/reports/dashboard/charts/ranked.js';
import { spectrumChart } from '../../../src/reports/dashboard/charts/spectrum.js';
import { logSteps, roundSteps } from '../../../src/reports/dashboard/charts/ticks.js';
import { pageData } from '../../support/page-data.js';

const BUILDERS: Readonly<Record<string, (data: PageData) => Chart | null>> = {
  spectrumChart,
  rankedChart,
  periodHeightChart,
  mapChart,
  provenanceChart,
};

/** The chart as the page draws it, without a browser. */
async function svgOf(chart: Chart): Promise<string> {
  const { vega, data } = compileChart(chart);
  const view = new View(parse(vega as Spec, undefined, { ast: true }), { renderer: 'none', expr: expressionInterpreter });
  for (const [name, columns] of Object.entries(data)) {
    const entries = Object.entries(columns).map(([field, packed]) => [field, unpackColumn(packed)] as const);
    const count = entries[0]?.[1].length ?? 0;
    view.data(name, Array.from({ length: count }, (_, r) => Object.fromEntries(entries.map(([field, values]) => [field, values[r]]))));
  }
  view.width(900);
  return view.toSVG();
}

describe.each(Object.entries(BUILDERS))('%s', (_, build) => {
  it('compiles without a warning and draws without an unknown number', async () => {
    for (const options of [{}, { listSize: 70 }, { count: 120, listSize: 80 }, { display: 'us' as const }, { count: 1, listSize: 1 }]) {
      const chart = build(pageData(options));
      if (chart === null) throw new Error('a chart was expected');
      expect(await svgOf(chart)).not.toMatch(/NaN|undefined/);
      expect(`${chart.title} ${chart.sentence}`).not.toMatch(/NaN|undefined|Infinity/);
      expect(chart.table.rows.flat().join(' ')).not.toMatch(/NaN|undefined|Infinity/);
    }
  });

  it('lets no name become markup', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(fc.constantFrom('<img src=x onerror=alert(1)>', '</script>', '"', "'", '&', '{{', 'x', '\\'), { maxLength: 6 }), async (parts) => {
        const base = pageData({ count: 6, listSize: 3 });
        const text = parts.join('');
        const data: PageData = {
          ...base,
          summary: { ...base.summary, attributes: base.summary.attributes.map((attribute) => ({ ...attribute, title: `${attribute.title}${text}` })) },
          buildings: { ...base.buildings, name: base.buildings.name.map(() => text), group: base.buildings.group.map(() => text) },
        };
        const chart = build(data);
        if (chart !== null) expect(await svgOf(chart)).not.toMatch(/<img|<\/script/);
      }),
      { numRuns: 12 },
    );
  });
});

describe('mapChart', () => {
  it('is absent without coordinates', () => {
    expect(mapChart(pageData({ coordinates: false }))).toBeNull();
  });

  it('measures a thousandth of a degree north as 111.2 m', () => {
    // Source: mean radius of the earth 6371.0088 km (IUGG); π/180 × R / 1000 = 111.195 m.
    const base = pageData({ count: 2, listSize: 2 });
    const data: PageData = { ...base, buildings: { ...base.buildings, lon: [10, 10], lat: [45, 45.001] } };
    const columns = mapChart(data)?.data['spots'] ?? {};
    const north = unpackColumn(columns['north'] ?? [2, []]).map(Number);
    expect(Math.abs((north[0] ?? 0) - (north[1] ?? 0))).toBeCloseTo(111.2, 1);
  });

  it('narrows a degree of longitude by the cosine of the latitude', () => {
    // cos 60° = 1/2 (trigonometry).
    const base = pageData({ count: 2, listSize: 2 });
    const at = (lat: number): number => {
      const data: PageData = { ...base, buildings: { ...base.buildings, lon: [10, 10.001], lat: [lat, lat] } };
      const east = unpackColumn(mapChart(data)?.data['spots']?.['east'] ?? [2, []]).map(Number);
      return Math.abs((east[0] ?? 0) - (east[1] ?? 0));
    };
    expect(at(60) / at(0)).toBeCloseTo(0.5, 3);
  });
});

describe('rankedChart', () => {
  it('counts the listed buildings whose whole band lies inside the list', () => {
    const data = pageData();
    const worst = data.buildings.results['rank_worst']?.slice(0, 12) ?? [];
    const inside = worst.filter((value) => Number(value) <= 12).length;
    expect(rankedChart(data).sentence).toMatch(new RegExp(`^${inside === 0 ? 'No' : String(inside)} listed building`));
  });
});

describe('provenanceChart', () => {
  it('fills every bar to the whole', () => {
    const ends = unpackColumn(provenanceChart(pageData()).data['parts']?.['to'] ?? [2, []]).map(Number);
    expect(ends.filter((_, i) => i % 4 === 3).every((end) => Math.abs(end - 1) < 1e-4)).toBe(true);
  });
});

describe('roundSteps', () => {
  it('reaches the end in round steps', () => {
    expect(roundSteps(1.5)).toEqual([0, 0.25, 0.5, 0.75, 1, 1.25, 1.5]);
  });
});

describe('logSteps', () => {
  it('takes 1, 2, 5 of each decade inside the bounds', () => {
    expect(logSteps(1, 60)).toEqual([1, 2, 5, 10, 20, 50]);
  });
});
