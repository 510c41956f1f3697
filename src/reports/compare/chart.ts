/** The before-and-after picture: the two lists side by side, a line for every building that holds or held a place. */
import type { Comparison, ExplainedMove } from '../../screening/compare-runs.js';
import { columnsOf, rendererFor } from '../dashboard/charts/chart.js';
import type { Chart } from '../dashboard/charts/chart.js';
import { logSteps } from '../dashboard/charts/ticks.js';
import { listSentence, listWord, moveWord, rankWord } from './words.js';

/** Up to so many buildings each has its line and labels; more are drawn as points, rank against rank. */
const MOST_LINES = 80;

const onLists = ({ buildings }: Comparison): readonly ExplainedMove[] =>
  buildings.filter(({ listed, listed_before }) => listed || listed_before);

/** The picture with its words and numbers. */
export function beforeAfterChart(comparison: Comparison): Chart {
  const moves = onLists(comparison);
  const lines = moves.length <= MOST_LINES;
  return {
    id: 'before-after',
    title: 'The list before and after',
    sentence: `${listSentence(comparison)} ${lines ? READING : READING_POINTS}`,
    table: {
      caption: 'Buildings of either list, with their ranks before and after',
      head: ['Building', 'Rank before', 'Rank after', 'Move', 'List'],
      rows: moves.map((move) => [
        move.name === null ? move.id : `${move.id} ${move.name}`,
        rankWord(move.rank_before),
        rankWord(move.rank),
        move.rank === null || move.rank_before === null ? '' : moveWord(move.rank - move.rank_before),
        listWord(move),
      ]),
    },
    ...(lines ? slopes(moves, comparison) : points(moves, comparison)),
  };
}

const READING =
  'Left the ranks before, right those after; below the dotted line stand the buildings outside the list, in the order of their ranks. Thin lines: on both lists; strong: entered; dashed: left.';
const READING_POINTS =
  'Each point is a building of either list, its rank before across and its rank after down: on the dotted line it has not moved, above it it has risen. Diamonds: on both lists; filled circles: entered; open circles: left.';

interface Column {
  /** Height of each building in the column, first place 1. */
  readonly at: ReadonlyMap<string, number>;
  readonly edge: number;
}

/** Places of the list as they are, those below it one under the other. */
function column(
  moves: readonly ExplainedMove[],
  rankOf: (move: ExplainedMove) => number | null,
  listed: (move: ExplainedMove) => boolean,
): Column {
  const ranked = moves.filter((move) => rankOf(move) !== null).sort((a, b) => (rankOf(a) ?? 0) - (rankOf(b) ?? 0));
  return {
    at: new Map(ranked.map(({ id }, i) => [id, i + 1])),
    edge: ranked.filter(listed).length + 0.5,
  };
}

const kindOf = ({ listed, listed_before }: ExplainedMove): string =>
  listed && listed_before ? 'stayed' : listed ? 'entered' : 'left';

function slopes(
  moves: readonly ExplainedMove[],
  { before, after }: Comparison,
): Pick<Chart, 'data' | 'spec' | 'renderer'> {
  const left = column(
    moves,
    (move) => move.rank_before,
    (move) => move.listed_before,
  );
  const right = column(
    moves,
    (move) => move.rank,
    (move) => move.listed,
  );
  const rows = Math.max(left.at.size, right.at.size, 1);
  const label = (rank: number | null, id: string, leftSide: boolean): string =>
    leftSide ? `${id}  ${rankWord(rank)}` : `${rankWord(rank)}  ${id}`;
  const ends = moves.flatMap((move) => {
    const kind = kindOf(move);
    const [y0, y1] = [left.at.get(move.id), right.at.get(move.id)];
    return [
      ...(y0 === undefined ? [] : [{ x: 0, y: y0, kind, label: label(move.rank_before, move.id, true) }]),
      ...(y1 === undefined ? [] : [{ x: 1, y: y1, kind, label: label(move.rank, move.id, false) }]),
    ];
  });
  const lines = moves.flatMap((move) => {
    const [y0, y1] = [left.at.get(move.id), right.at.get(move.id)];
    return y0 === undefined || y1 === undefined ? [] : [{ x: 0, x1: 1, y0, y1, kind: kindOf(move) }];
  });
  const heads = [
    { x: 0, y: 0, label: `run ${String(before.run)}` },
    { x: 1, y: 0, label: `run ${String(after.run)}` },
  ];
  const edges = [
    { x: 0, y: left.edge },
    { x: 1, y: right.edge },
  ];
  const x = { field: 'x', type: 'quantitative' as const, axis: null, scale: { domain: [0, 1], nice: false } };
  const scale = { domain: [-0.6, rows + 0.6], reverse: true, nice: false, zero: false };
  const y = { field: 'y', type: 'quantitative' as const, axis: null, scale };
  const text = (side: 0 | 1, data: string, bold: boolean) => ({
    data: { name: data },
    transform: [{ filter: `datum.x === ${String(side)}` }],
    mark: {
      type: 'text' as const,
      align: side === 0 ? ('right' as const) : ('left' as const),
      dx: side === 0 ? -9 : 9,
      limit: 102,
      fontSize: 12,
      ...(bold ? { fontWeight: 600 as const } : {}),
    },
    encoding: { x, y, text: { field: 'label', type: 'nominal' as const } },
  });
  const rule = (kind: string, mark: object) => ({
    data: { name: 'lines' },
    transform: [{ filter: `datum.kind === '${kind}'` }],
    mark: { type: 'rule' as const, ...mark },
    encoding: { x, x2: { field: 'x1' }, y: { ...y, field: 'y0' }, y2: { field: 'y1' } },
  });
  return {
    renderer: 'svg',
    data: { lines: columnsOf(lines), ends: columnsOf(ends), heads: columnsOf(heads), edges: columnsOf(edges) },
    spec: {
      width: 'container',
      height: (rows + 1.2) * 21,
      padding: { left: 4, right: 4, top: 4, bottom: 8 },
      layer: [
        rule('stayed', { strokeWidth: 1.4, color: 'var(--mark-soft)' }),
        rule('left', { strokeWidth: 1.6, color: 'var(--ink-soft)', strokeDash: [5, 4] }),
        rule('entered', { strokeWidth: 2.6, color: 'var(--accent)' }),
        {
          data: { name: 'edges' },
          mark: { type: 'line', strokeWidth: 1.2, strokeDash: [2, 3], color: 'var(--ink)' },
          encoding: { x, y },
        },
        {
          data: { name: 'ends' },
          mark: { type: 'point', filled: true, opacity: 1, size: 40 },
          encoding: {
            x,
            y,
            color: {
              condition: { test: "datum.kind === 'entered'", value: 'var(--accent)' },
              value: 'var(--mark)',
            },
          },
        },
        text(0, 'ends', false),
        text(1, 'ends', false),
        text(0, 'heads', true),
        text(1, 'heads', true),
      ],
    },
  };
}

function points(
  moves: readonly ExplainedMove[],
  { before, after }: Comparison,
): Pick<Chart, 'data' | 'spec' | 'renderer'> {
  const rows = moves.flatMap((move) =>
    move.rank === null || move.rank_before === null
      ? []
      : [{ before: move.rank_before, after: move.rank, kind: kindOf(move) }],
  );
  const worst = rows.reduce((most, row) => Math.max(most, row.before, row.after), 2);
  const scale = { type: 'log' as const, domain: [0.9, worst * 1.1], nice: false };
  const axis = { values: [...logSteps(1, worst)], format: 'd' };
  const x = {
    field: 'before',
    type: 'quantitative' as const,
    title: `Rank in run ${String(before.run)}, logarithmic scale`,
    scale,
    axis,
  };
  const y = {
    field: 'after',
    type: 'quantitative' as const,
    title: `Rank in run ${String(after.run)}`,
    scale: { ...scale, reverse: true },
    axis,
  };
  const diagonal = [
    { before: 0.9, after: 0.9 },
    { before: worst * 1.1, after: worst * 1.1 },
  ];
  return {
    renderer: rendererFor(rows.length),
    data: { rows: columnsOf(rows, 7), diagonal: columnsOf(diagonal) },
    spec: {
      width: 'container',
      height: 520,
      layer: [
        {
          data: { name: 'diagonal' },
          mark: { type: 'line', strokeWidth: 1.2, strokeDash: [2, 3], color: 'var(--ink)' },
          encoding: { x, y },
        },
        {
          data: { name: 'rows' },
          mark: { type: 'point', strokeWidth: 1.4, size: 36, opacity: 1, stroke: 'var(--accent)' },
          encoding: {
            x,
            y,
            shape: {
              field: 'kind',
              type: 'nominal',
              scale: { domain: ['stayed', 'entered', 'left'], range: ['diamond', 'circle', 'circle'] },
              legend: null,
            },
            fill: { condition: { test: "datum.kind === 'left'", value: 'var(--paper)' }, value: 'var(--mark-soft)' },
          },
        },
      ],
    },
  };
}
