/** The design spectrum with the portfolio's governing periods hanging under the same axis. */
import { compileContext } from '../../../engineering/assess/context.js';
import { siteSpectrum } from '../../../engineering/assess/site-spectrum.js';
import { formatCount, formatNumber, formatQuantity, formatShare } from '../../../engineering/format.js';
import type { GridSpread, PageData } from '../../../engineering/page-contract.js';
import { ordinate } from '../../../engineering/spectrum/compiled.js';
import type { CompiledSpectrum } from '../../../engineering/spectrum/compiled.js';
import { compileSpectrum } from '../../../engineering/spectrum/definition.js';
import { HAZARD_GRID } from '../../../engineering/spectrum/grid.js';
import { gridsOf } from '../../../engineering/spectrum/grid-carry.js';
import { governingPeriod, listLength, middle, rankedShown, textAt } from '../reading.js';
import { columnsOf } from './chart.js';
import type { Chart } from './chart.js';
import { roundSteps } from './ticks.js';

type LayerSpec = Extract<Chart['spec'], { layer: unknown }>['layer'][number];

interface NamedCurve {
  readonly name: string;
  readonly level: string;
  /** Of a grid the median of its buildings. */
  readonly compiled: CompiledSpectrum;
  readonly band: Band | null;
}

/** The 5th and 95th percentile of the ordinates of a grid over the buildings that read it. */
interface Band {
  readonly buildings: number;
  readonly low: CompiledSpectrum;
  readonly high: CompiledSpectrum;
}

/** Every spectrum a level reads, the ranking level first. */
function curvesOf({ settings, summary }: PageData): readonly NamedCurve[] {
  return settings.levels.slice(0, 2).flatMap((level) => {
    const names = [...new Set([...Object.values(level.spectra), ...(level.otherwise === null ? [] : [level.otherwise])])];
    return names.flatMap((name): NamedCurve[] => {
      const named = settings.spectra[name];
      if (named === undefined) return [];
      const { return_period_years, ...definition } = named;
      const years = return_period_years === undefined ? '' : `, ${formatCount(return_period_years)} years`;
      const curve = { name, level: `${level.title}${years}` };
      if (definition.code !== HAZARD_GRID) return [{ ...curve, compiled: compileSpectrum(definition).compiled, band: null }];
      const spread = summary.grids?.find(({ spectrum }) => spectrum === name);
      if (spread === undefined) return [];
      const table = (ordinates_g: readonly number[]): CompiledSpectrum =>
        compileSpectrum({ code: 'table', periods_s: spread.periods_s, ordinates_g, interpolation: definition['interpolation'] }).compiled;
      return [{ ...curve, compiled: table(spread.median_g), band: bandOf(spread, table) }];
    });
  });
}

function bandOf({ buildings, low_g, high_g }: GridSpread, table: (ordinates_g: readonly number[]) => CompiledSpectrum): Band {
  return { buildings, low: table(low_g), high: table(high_g) };
}

const seriesName = ({ name, level, band }: NamedCurve): string => `${name}${band === null ? '' : ', median'} (${level})`;

/** End of the plateau of the spectrum that building `i` reads; NaN where there is none. */
function cornersOf(data: PageData): (i: number) => number {
  const { spectra, grids } = compileContext(data.settings, gridsOf(data.grids));
  const { place } = data.buildings.inputs;
  return (i) => {
    const name = textAt(data, 'spectrum', i);
    const source = grids.get(name);
    if (source === undefined) return spectra[name]?.corner_s ?? NaN;
    const found = siteSpectrum(source, place?.lon[i] ?? NaN, place?.lat[i] ?? NaN);
    return typeof found === 'string' ? NaN : found.corner_s;
  };
}

function samplePeriods({ compiled }: NamedCurve, to_s: number): readonly number[] {
  const corners = compiled.segments.flatMap(({ from_s }) => [from_s - 1e-6, from_s]);
  const periods = [...Array.from({ length: 161 }, (_, i) => (i * to_s) / 160), ...corners].filter((t) => t >= 0 && t <= to_s);
  return [...new Set(periods)].sort((a, b) => a - b);
}

function sample(curve: NamedCurve, to_s: number) {
  return samplePeriods(curve, to_s).map((period_s) => ({ series: seriesName(curve), period_s, sa_g: ordinate(curve.compiled, period_s) }));
}

function sampleBand(curve: NamedCurve, to_s: number) {
  const { band } = curve;
  if (band === null) return [];
  return samplePeriods(curve, to_s).map((period_s) => ({
    series: seriesName(curve),
    period_s,
    low_g: ordinate(band.low, period_s),
    high_g: ordinate(band.high, period_s),
  }));
}

/** Share of the plot's height under the axis that the strip of buildings takes. */
const STRIP = 0.34;

/** The spectrum chart. */
export function spectrumChart(data: PageData): Chart {
  const shown = rankedShown(data);
  const listed = listLength(data);
  const periods = Array.from({ length: shown }, (_, i) => governingPeriod(data, i));
  const longest = periods.reduce((most, value) => Math.max(most, value), 0);
  const to_s = Math.min(6, Math.max(2, Math.ceil(longest * 2.1) / 2));
  const width_s = to_s > 4 ? 0.1 : 0.05;
  const curves = curvesOf(data);
  const points = curves.flatMap((curve) => sample(curve, to_s));
  const bands = curves.flatMap((curve) => sampleBand(curve, to_s));
  const top_g = points.reduce((most, { sa_g }) => Math.max(most, sa_g), 0.1);
  const most_g = bands.reduce((most, { high_g }) => Math.max(most, high_g), top_g);
  const bins = Array.from({ length: Math.ceil(to_s / width_s - 1e-9) }, (_, b) => ({ from_s: b * width_s, to_s: (b + 1) * width_s, count: 0, inList: 0 }));
  periods.forEach((period_s, i) => {
    const bin = bins[Math.min(Math.floor(period_s / width_s), Math.ceil(to_s / width_s) - 1)];
    if (bin === undefined) return;
    bin.count += 1;
    if (i < listed) bin.inList += 1;
  });
  const tallest = bins.reduce((most, { count }) => Math.max(most, count), 1);
  const bars = bins.map((bin) => ({
    ...bin,
    edge: 0,
    all: (-STRIP * most_g * 0.86 * bin.count) / tallest,
    listed: (-STRIP * most_g * 0.86 * bin.inList) / tallest,
  }));
  const members = periods.slice(0, Math.max(listed, 1));
  const rug = members.map((period_s, i) => ({ i, period_s, edge: 0, sa_g: 0.03 * most_g }));
  const step = `${formatNumber(width_s, 1)} s`;
  const note = `buildings per ${step}; tallest bar: ${formatCount(tallest)}`;
  return {
    id: 'spectrum',
    title: 'Where the buildings’ periods meet the design spectrum',
    sentence: `${sentence(data, periods, listed)} The bars hanging under the axis count buildings by governing period, ${step} each; the stronger colour, and each tick on the axis, is a listed building.${bandSentence(curves)}`,
    table: {
      caption: `Buildings by governing period, in steps of ${step}, with the spectra at the middle of each step`,
      head: ['Period (s)', 'Buildings', 'In the list', ...curves.flatMap(({ name, band }) => (band === null ? [`S_a, ${name} (g)`] : [`S_a, ${name}, median (g)`, `${name}, 5 to 95 % (g)`]))],
      rows: bins
        .filter(({ count }) => count > 0)
        .map((bin) => [
          `${bin.from_s.toFixed(2)} to ${bin.to_s.toFixed(2)}`,
          formatCount(bin.count),
          formatCount(bin.inList),
          ...curves.flatMap(({ compiled, band }) => {
            const at = (spectrum: CompiledSpectrum): string => formatNumber(ordinate(spectrum, (bin.from_s + bin.to_s) / 2), 3);
            return band === null ? [at(compiled)] : [at(compiled), `${at(band.low)} to ${at(band.high)}`];
          }),
        ]),
    },
    data: { ...(bands.length === 0 ? {} : { bands: columnsOf(bands) }), curves: columnsOf(points), bars: columnsOf(bars), rug: columnsOf(rug), note: columnsOf([{ text: note, period_s: to_s, sa_g: -STRIP * most_g }]) },
    renderer: 'svg',
    spec: spec(to_s, most_g, curves),
  };
}

function spec(to_s: number, most_g: number, curves: readonly NamedCurve[]): Chart['spec'] {
  const series = curves.map(seriesName);
  const [first] = curves;
  const perLevel = curves.filter(({ level }) => level === first?.level).length;
  const period = { field: 'period_s', type: 'quantitative' as const, title: 'Period T (s)', scale: { domain: [0, to_s], nice: false }, axis: { grid: false, labelOverlap: true, labelFlush: false } };
  const acceleration = {
    type: 'quantitative' as const,
    title: 'Spectral acceleration Sₐ (g)',
    scale: { domain: [-STRIP * most_g, 1.06 * most_g], nice: false, zero: false },
    axis: { values: [...roundSteps(most_g)], format: '.2~f', titleY: { expr: 'height * 0.37' } },
  };
  return {
    width: 'container',
    height: 380,
    layer: [
      ...bandLayer(curves, period, acceleration),
      {
        data: { name: 'bars' },
        mark: { type: 'rect', color: 'var(--mark-faint)' },
        encoding: { x: { ...period, field: 'from_s' }, x2: { field: 'to_s' }, y: { ...acceleration, field: 'edge' }, y2: { field: 'all' } },
      },
      {
        data: { name: 'bars' },
        mark: { type: 'rect', color: 'var(--accent)' },
        encoding: { x: { ...period, field: 'from_s' }, x2: { field: 'to_s' }, y: { ...acceleration, field: 'edge' }, y2: { field: 'listed' } },
      },
      {
        data: { name: 'curves' },
        mark: { type: 'line', strokeWidth: 2.2 },
        encoding: {
          x: period,
          y: { ...acceleration, field: 'sa_g' },
          color: {
            field: 'series',
            type: 'nominal' as const,
            sort: null,
            title: null,
            legend: { symbolSize: 900, columns: { expr: 'containerSize()[0] < 640 ? 1 : 2' } },
            scale: { domain: series, range: curves.map(({ level }) => (level === first?.level ? 'var(--mark)' : 'var(--mark-soft)')) },
          },
          strokeDash: {
            field: 'series',
            sort: null,
            type: 'nominal' as const,
            title: null,
            scale: { domain: series, range: series.map((_, i) => DASHES[(i % Math.max(perLevel, 1)) % DASHES.length] ?? [1, 0]) },
          },
        },
      },
      {
        data: { name: 'rug' },
        mark: { type: 'rule', color: 'var(--accent)', strokeWidth: 1 },
        encoding: { x: period, y: { ...acceleration, field: 'edge' }, y2: { field: 'sa_g' } },
      },
      { mark: { type: 'rule', color: 'var(--ink-soft)' }, encoding: { y: { datum: 0, type: 'quantitative' as const } }, data: { values: [{}] } },
      {
        data: { name: 'note' },
        mark: { type: 'text', align: 'right', baseline: 'bottom', dy: -4, color: 'var(--ink-soft)', fontSize: 11.5, limit: { expr: 'width' } },
        encoding: { x: period, y: { ...acceleration, field: 'sa_g' }, text: { field: 'text', type: 'nominal' as const } },
      },
    ],
  };
}

/** The bands of the grids, under all else. */
function bandLayer(curves: readonly NamedCurve[], period: object, acceleration: object): LayerSpec[] {
  if (curves.every(({ band }) => band === null)) return [];
  return [
    {
      data: { name: 'bands' },
      mark: { type: 'area', color: 'var(--mark-faint)', opacity: 0.7 },
      encoding: {
        x: { ...period, field: 'period_s' },
        y: { ...acceleration, field: 'low_g' },
        y2: { field: 'high_g' },
        detail: { field: 'series', type: 'nominal' as const },
      },
    },
  ];
}

/** What is drawn of a spectrum that differs from building to building. */
function bandSentence(curves: readonly NamedCurve[]): string {
  const grids = curves.flatMap(({ name, band }) => (band === null ? [] : [{ name, band }]));
  const [first] = grids;
  if (first === undefined) return '';
  const names = grids.map(({ name }) => name).join(' and ');
  const read = grids.length === 1 ? `The spectrum ${names} is read from a grid` : `The spectra ${names} are read from grids`;
  return ` ${read} at each building’s own place: drawn are the median of the ordinates of ${formatCount(first.band.buildings)} buildings, period by period, and as a band where the middle 90 % of them lie (5 to 95 %).`;
}

const DASHES: readonly number[][] = [[1, 0], [7, 3], [2, 3], [10, 3, 2, 3], [4, 2], [1, 2]];

function sentence(data: PageData, periods: readonly number[], listed: number): string {
  if (periods.length === 0) return 'No building could be ranked, so only the spectra are drawn.';
  const cornerAt = cornersOf(data);
  const onPlateau = (count: number): number =>
    periods.slice(0, count).filter((period_s, i) => period_s <= cornerAt(i)).length;
  const s = (value: number): string => formatQuantity(value, 's', data.display);
  return (
    `Governing periods run from ${s(Math.min(...periods))} to ${s(Math.max(...periods))}, half of them below ${s(middle(periods))}. ` +
    `${formatShare(onPlateau(periods.length) / periods.length)} of the ranked buildings lie on or below the plateau of their spectrum, where demand is largest` +
    (listed === 0 ? '.' : `, and ${formatShare(onPlateau(listed) / listed)} of the list does.`)
  );
}
