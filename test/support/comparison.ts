/** Comparisons of invented rankings, made by the same parts as those of real runs. */
import { changeParts, rankMoves } from '../../src/engineering/priority/compare.js';
import type { Comparison, ExplainedMove } from '../../src/screening/compare-runs.js';
import type { ComparedRun, LeadingSide } from '../../src/screening/read-compared.js';
import { HOSTILE_NAME } from './page-data.js';

function run(number: number, listSize: number, count: number): ComparedRun {
  return {
    run: number,
    made: '2026-06-11T09:00:00.000Z',
    program: 'swaymark 0.1.0',
    note: number === 2 ? HOSTILE_NAME : '',
    title: `Invented ${HOSTILE_NAME}`,
    file: `inventory-${String(number)}.csv`,
    buildings: count,
    ranked: count,
    list_size: listSize,
    rank_by: 'people',
    fingerprints: { study: `s${String(number)}`, inventory: `i${String(number)}`, methods: 'm' },
  };
}

function side(demand: number): LeadingSide {
  return {
    ln_priority: 2.5 * Math.log(demand / 0.2) + Math.log(10) + 0.1,
    slope_k: 2.5,
    sa_g: demand,
    capacity_g: 0.2,
    people_exposed: 10,
    importance_factor: 1,
    zone_term: 0,
    period_s: 0.4,
    system: 'concrete-moment-frame',
    edition: 'ubc-1976',
    spectrum: 'design',
  };
}

/** `count` invented buildings whose demands change by a fixed pattern; the list has `listSize` places. */
export function inventedComparison(count: number, listSize: number): Comparison {
  const id = (i: number): string => `EX-${String(i).padStart(4, '0')}`;
  const before = Array.from({ length: count }, (_, i) => side(1 - (0.7 * i) / count));
  const after = before.map((was, i) => side(was.sa_g * (1 + 0.3 * Math.sin(7 * i))));
  const ladder = (of: readonly LeadingSide[]) => {
    const order = of.map((_, i) => i).sort((a, b) => of[b]!.ln_priority - of[a]!.ln_priority);
    return { id: order.map(id), lnPriority: order.map((i) => of[i]!.ln_priority), people: order.map(() => 10) };
  };
  const { common, moves } = rankMoves(ladder(before), ladder(after));
  const all = before.map((was, i): ExplainedMove => {
    const move = moves.get(id(i))!;
    return {
      id: id(i),
      name: i === 0 ? HOSTILE_NAME : null,
      rank_before: move.rank_before,
      rank: move.rank,
      listed_before: move.rank_before <= listSize,
      listed: move.rank <= listSize,
      chance_before: 0.5,
      chance: 0.5,
      came: false,
      went: false,
      not_ranked: null,
      change: after[i]!.ln_priority - was.ln_priority,
      parts: changeParts(was, after[i]!),
      move,
      before: was,
      after: after[i]!,
      inputs:
        i === 0
          ? [{ field: 'name', title: 'Name', before: 'A', origin_before: null, after: HOSTILE_NAME, origin: null }]
          : [],
    };
  });
  const listed = all.filter((one) => one.listed).sort((a, b) => a.rank! - b.rank!);
  const left = all.filter((one) => one.listed_before && !one.listed);
  return {
    before: run(1, listSize, count),
    after: run(2, listSize, count),
    settings: [{ path: 'hazard.spectra.design.sds_g', before: 1, after: HOSTILE_NAME }],
    differs: { program: false, methods: false, study: true, inventory: true },
    list: {
      overlap: listed.filter((one) => one.listed_before).length,
      places_before: listSize,
      places: listSize,
      entered: listed.filter((one) => !one.listed_before).map((one) => one.id),
      left: left.map((one) => one.id),
    },
    ranked_both: count,
    moved: all.filter(({ rank, rank_before }) => rank !== rank_before).length,
    tau_b: 0.8,
    common_change: common,
    data: {
      came: [{ id: 'NEW-1', name: HOSTILE_NAME, rank: null }],
      went: [],
      in_both: count,
      changed: 1,
      fields: [{ field: 'name', title: 'Name', buildings: 1, given_both: 1 }],
    },
    buildings: [...listed, ...left],
  };
}
