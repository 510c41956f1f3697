/** The head of the ranking: each building's place with the band in which its true rank lies, and the edge of the list. */
import { formatCount, formatShare } from '../../../engineering/format.js';
import type { PageData } from '../../../engineering/page-contract.js';
import { buildingLabel, counted, listLength, numberAt, rankedShown } from '../reading.js';
import { columnsOf } from './chart.js';
import type { Chart } from './chart.js';
import { logSteps } from './ticks.js';

/** Up to so many rows each has its label; more are drawn closely. */
const MOST_LABELLED = 60;

/** The ranked chart. */
export function rankedChart(data: PageData): Chart {
  const listed = listLength(data);
  const shown = Math.min(rankedShown(data), Math.max(Math.ceil(1.5 * data.summary.list_size), 5));
  const rows = Array.from({ length: shown }, (_, i) => ({
    i,
    rank: numberAt(data, 'rank', i),
    best: numberAt(data, 'rank_best', i),
    worst: numberAt(data, 'rank_worst', i),
    place: i < listed ? 'in the list' : 'below the list',
    label: `${String(i + 1)}  ${buildingLabel(data, i)}`,
    short: `${String(i + 1)}  ${data.buildings.inputs.id[i] ?? ''}`,
    chance: formatShare(numberAt(data, 'chance', i)),
  }));
  const worst = rows.reduce((most, row) => Math.max(most, row.worst), Math.max(listed, 2));
  const labelled = shown <= MOST_LABELLED;
  const edge = [{ edge: listed + 0.5, text: `edge of the list: ${formatCount(listed)}` }];
  return {
    id: 'ranked',
    title: `How firmly the first ${formatCount(shown)} places stand`,
    sentence: `${sentence(rows, listed)} ${labelled ? READING : READING_DENSE}`,
    table: {
      caption: 'Rank, band of the true rank (5 to 95 %) and chance of belonging to the list',
      head: ['Rank', 'Building', 'Best rank', 'Worst rank', 'Chance of belonging'],
      rows: rows.map((row, i) => [formatCount(row.rank), buildingLabel(data, i), formatCount(row.best), formatCount(row.worst), row.chance]),
    },
    data: { rows: columnsOf(rows, 7), edge: columnsOf(edge) },
    renderer: 'svg',
    spec: labelled ? labelledSpec(shown, worst) : denseSpec(worst),
  };
}

const xScale = (worst: number) => ({ type: 'log' as const, domain: [0.9, worst * 1.08], nice: false });
const xAxis = (worst: number) => ({ values: [...logSteps(1, worst)], format: 'd', orient: 'top' as const });
const IN_LIST = "datum.place === 'in the list'";
const READING =
  'Bars: band of the true rank, 5 to 95 %. Filled diamonds are in the list, open circles below it; figures at the right: chance of belonging to the list.';
const READING_DENSE = 'Bars: band of the true rank, 5 to 95 %; dots: rank; dashed: the edge of the list.';
const RANK_TITLE = 'Rank, logarithmic scale';

function labelledSpec(shown: number, worst: number): Chart['spec'] {
  const x = { field: 'rank', type: 'quantitative' as const, title: RANK_TITLE, scale: xScale(worst), axis: xAxis(worst) };
  const y = {
    field: 'label',
    type: 'ordinal' as const,
    sort: null,
    title: null,
    axis: {
      labelExpr: "containerSize()[0] < 560 ? split(datum.label, ' ')[0] + '  ' + split(datum.label, ' ')[2] : datum.label",
      labelLimit: 250,
      domain: false,
      ticks: false,
      grid: false,
      labelPadding: 8,
    },
  };
  return {
    width: 'container',
    height: Math.max(shown, 1) * 21,
    padding: { left: 4, right: 62, top: 4, bottom: 22 },
    layer: [
      {
        data: { name: 'rows' },
        mark: { type: 'rule', strokeWidth: 7, color: 'var(--mark-faint)', strokeCap: 'round' },
        encoding: { x: { ...x, field: 'best' }, x2: { field: 'worst' }, y },
      },
      {
        data: { name: 'edge' },
        mark: { type: 'rule', color: 'var(--ink)', strokeDash: [4, 3], strokeWidth: 1.4 },
        encoding: { x: { ...x, field: 'edge' } },
      },
      {
        data: { name: 'edge' },
        mark: { type: 'text', align: 'left', baseline: 'bottom', dx: 5, dy: -2, y: { expr: 'height + 14' }, fontSize: 11.5 },
        encoding: { x: { ...x, field: 'edge' }, text: { field: 'text', type: 'nominal' as const } },
      },
      placePoints(x, y),
      {
        data: { name: 'rows' },
        mark: { type: 'text', align: 'left', x: { expr: 'width + 8' }, color: 'var(--ink-soft)' },
        encoding: { y, text: { field: 'chance', type: 'nominal' as const } },
      },
    ],
  };
}

function placePoints<X, Y>(x: X, y: Y) {
  return {
    data: { name: 'rows' },
    mark: { type: 'point' as const, filled: true, opacity: 1, strokeWidth: 1.6, stroke: 'var(--accent)' },
    encoding: {
      x,
      y,
      shape: {
        field: 'place',
        type: 'nominal' as const,
        title: null,
        scale: { domain: ['in the list', 'below the list'], range: ['diamond', 'circle'] },
        legend: null,
      },
      fill: { condition: { test: IN_LIST, value: 'var(--accent)' }, value: 'var(--paper)' },
      size: { condition: { test: IN_LIST, value: 95 }, value: 55 },
    },
  };
}

function denseSpec(worst: number): Chart['spec'] {
  const x = { field: 'rank', type: 'quantitative' as const, title: RANK_TITLE, scale: xScale(worst), axis: xAxis(worst) };
  const y = { field: 'rank', type: 'quantitative' as const, title: 'Rank', scale: { reverse: true, zero: false, nice: false } };
  return {
    width: 'container',
    height: 520,
    padding: { left: 4, right: 4, top: 4, bottom: 24 },
    layer: [
      {
        data: { name: 'rows' },
        mark: { type: 'rule', strokeWidth: 1.5, color: 'var(--mark-faint)' },
        encoding: { x: { ...x, field: 'best' }, x2: { field: 'worst' }, y },
      },
      {
        data: { name: 'rows' },
        mark: { type: 'point', filled: true, size: 14, opacity: 1, color: 'var(--accent)' },
        encoding: { x, y },
      },
      {
        data: { name: 'edge' },
        mark: { type: 'rule', color: 'var(--ink)', strokeDash: [4, 3], strokeWidth: 1.4 },
        encoding: { x: { ...x, field: 'edge' } },
      },
      {
        data: { name: 'edge' },
        mark: { type: 'text', align: 'left', baseline: 'bottom', dx: 5, y: { expr: 'height + 16' }, fontSize: 11.5 },
        encoding: { x: { ...x, field: 'edge' }, text: { field: 'text', type: 'nominal' as const } },
      },
    ],
  };
}

function sentence(rows: readonly { readonly best: number; readonly worst: number }[], listed: number): string {
  if (rows.length === 0) return 'No building could be ranked.';
  const firm = rows.slice(0, listed).filter(({ worst }) => worst <= listed).length;
  const reaching = rows.slice(listed).filter(({ best }) => best <= listed).length;
  return (
    `${firm === 0 ? 'No listed building has its' : counted(firm, 'listed building has its', 'listed buildings have their')} whole band inside the list of ${formatCount(listed)}; ` +
    `of the ${counted(rows.length - listed, 'next building', 'next buildings')} drawn, ${formatCount(reaching)} could belong to the list.`
  );
}
