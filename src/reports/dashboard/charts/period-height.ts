/** Period against height, with the curves of the height formulas in use. */
import { formatCount, formatNumber, formatQuantity, shownValue, unitLabel } from '../../../engineering/format.js';
import { apply } from '../../../engineering/formula.js';
import type { MethodRecord } from '../../../engineering/formula.js';
import type { PageData } from '../../../engineering/page-contract.js';
import { formulasOf } from '../../../engineering/period/choose.js';
import type { HeightInput } from '../../../engineering/period/families.js';
import { cite } from '../../../engineering/source.js';
import { counted, governingPeriod, listLength, middle, rankedShown, textAt } from '../reading.js';
import { columnsOf, rendererFor } from './chart.js';
import type { Chart } from './chart.js';
import { logSteps } from './ticks.js';

const EVIDENCE = ['measured', 'stiffness', 'formula and stiffness', 'formula'] as const;
const SHAPES = ['diamond', 'triangle-up', 'square', 'circle'] as const;

/** The period and height chart. */
export function periodHeightChart(data: PageData): Chart {
  const { display } = data;
  const listed = listLength(data);
  const heights = data.buildings.inputs.numbers.height_m;
  const points = Array.from({ length: rankedShown(data) }, (_, i) => ({
    i,
    height_m: heights[i] ?? NaN,
    height: shownValue(heights[i] ?? NaN, 'm', display),
    period_s: governingPeriod(data, i),
    from: textAt(data, 'period_evidence', i),
    place: i < listed ? 'in the list' : 'not in the list',
  })).filter(({ height, period_s }) => height > 0 && period_s > 0);
  const small = points.length > 1000 ? 12 : 34;
  const tallest_m = points.reduce((most, { height_m }) => Math.max(most, height_m), 20) * 1.15;
  const lowest_m = points.reduce((least, { height_m }) => Math.min(least, height_m), 6) / 1.15;
  const formulas = formulasOf(data.settings.period.standard, data.settings.period.basis);
  const curves = formulas.flatMap((record) =>
    [0, 0.25, 0.5, 0.75, 1].map((share) => {
      const height_m = lowest_m * (tallest_m / lowest_m) ** share;
      return {
        formula: `${record.title.replace(/^\w+ period, /, '')}`,
        height: shownValue(height_m, 'm', display),
        period_s: apply(record as MethodRecord<HeightInput>, { height_m }),
      };
    }),
  );
  const all = [...points, ...curves].map(({ period_s }) => period_s);
  const bounds_s = [all.reduce((a, b) => Math.min(a, b), 1) / 1.1, all.reduce((a, b) => Math.max(a, b), 0.1) * 1.1] as const;
  const bounds = [shownValue(lowest_m, 'm', display), shownValue(tallest_m, 'm', display)] as const;
  const source = formulas[0] === undefined ? '' : cite(formulas[0].source);
  return {
    id: 'period-height',
    title: 'Period against height, with the height formulas in use',
    sentence: sentence(data, points, source),
    table: table(data, points),
    data: {
      // The list comes last, so that it is drawn on top.
      points: columnsOf(points.map(({ height_m: _, ...point }) => ({ ...point, size: point.i < listed ? 110 : small })).reverse(), 4),
      curves: columnsOf(curves),
    },
    renderer: rendererFor(points.length),
    spec: spec(unitLabel('m', display), bounds, bounds_s, [...new Set(curves.map(({ formula }) => formula))], points),
  };
}

type Point = { readonly height_m: number; readonly period_s: number; readonly from: string };

function sentence({ display }: PageData, points: readonly Point[], source: string): string {
  const by = EVIDENCE.map((name) => ({ name, count: points.filter(({ from }) => from === name).length })).filter(({ count }) => count > 0);
  const parts = by.map(({ name, count }) => `${formatCount(count)} from ${name === 'measured' ? 'measurement' : name}`);
  return (
    `${counted(points.length, 'building', 'buildings')}: periods ${parts.join(', ')}; the curves are the height formulas of ${source}. ` +
    `The middle building is ${formatQuantity(middle(points.map(({ height_m }) => height_m)), 'm', display)} high with a period of ${formatQuantity(middle(points.map(({ period_s }) => period_s)), 's', display)}. ` +
    'Both scales are logarithmic, so a formula is a straight line; a point off its line carries a measurement, a stiffness or a mixture of systems.'
  );
}

function table({ display }: PageData, points: readonly Point[]): Chart['table'] {
  const edges = [0, 5, 10, 15, 20, 30, 50, 100, Infinity];
  const rows = edges.slice(0, -1).map((from, b) => ({ from, to: edges[b + 1] ?? Infinity }));
  const length = (value: number): string => formatNumber(shownValue(value, 'm', display), 3);
  return {
    caption: 'Periods by height, median and extremes; the single buildings stand in the table of all buildings',
    head: [`Height (${unitLabel('m', display)})`, 'Buildings', 'Shortest period (s)', 'Median period (s)', 'Longest period (s)'],
    rows: rows.flatMap(({ from, to }) => {
      const periods = points.filter(({ height_m }) => height_m >= from && height_m < to).map(({ period_s }) => period_s);
      if (periods.length === 0) return [];
      const span = to === Infinity ? `${length(from)} and more` : `${length(from)} to ${length(to)}`;
      const ends = [periods.reduce((a, b) => Math.min(a, b)), middle(periods), periods.reduce((a, b) => Math.max(a, b))];
      return [[span, formatCount(periods.length), ...ends.map((value) => formatNumber(value, 3))]];
    }),
  };
}

function spec(
  unit: string,
  bounds: readonly [number, number],
  bounds_s: readonly [number, number],
  formulas: readonly string[],
  points: readonly Point[],
): Chart['spec'] {
  const count = points.length;
  // The legend names what is drawn; each kind keeps its shape.
  const kinds = EVIDENCE.map((name, e) => ({ name, shape: SHAPES[e] ?? 'circle' })).filter(({ name }) => points.some(({ from }) => from === name));
  const x = {
    field: 'height',
    type: 'quantitative' as const,
    title: `Height (${unit}), logarithmic scale`,
    scale: { type: 'log' as const, domain: [...bounds], nice: false },
    axis: { values: [...logSteps(...bounds)], format: '~g' },
  };
  const y = {
    field: 'period_s',
    type: 'quantitative' as const,
    title: 'Period T, governing direction (s), logarithmic scale',
    scale: { type: 'log' as const, domain: [...bounds_s], nice: false },
    axis: { values: [...logSteps(...bounds_s)], format: '~g' },
  };
  const dashes = [[1, 0], [7, 3], [2, 3], [10, 3, 2, 3], [4, 2]];
  return {
    width: 'container',
    height: 400,
    layer: [
      {
        data: { name: 'curves' },
        mark: { type: 'line', strokeWidth: 1.6, color: 'var(--ink-soft)' },
        encoding: {
          x,
          y,
          strokeDash: {
            field: 'formula',
            type: 'nominal' as const,
            title: 'Formula',
            legend: { symbolSize: 900, columns: { expr: 'containerSize()[0] < 640 ? 1 : 2' } },
            scale: { domain: [...formulas], range: formulas.map((_, i) => dashes[i % dashes.length] ?? [1, 0]) },
          },
        },
      },
      {
        data: { name: 'points' },
        mark: { type: 'point', filled: true, opacity: count > 1000 ? 0.55 : 0.85, strokeWidth: 1 },
        encoding: {
          x,
          y,
          shape: { field: 'from', type: 'nominal' as const, title: 'Period from', legend: { columns: 2 }, scale: { domain: kinds.map(({ name }) => name), range: kinds.map(({ shape }) => shape) } },
          color: {
            field: 'place',
            type: 'nominal' as const,
            title: 'Place',
            legend: { columns: 1 },
            scale: { domain: ['in the list', 'not in the list'], range: ['var(--accent)', 'var(--mark)'] },
          },
          size: { field: 'size', type: 'quantitative' as const, scale: null },
        },
      },
    ],
  };
}
