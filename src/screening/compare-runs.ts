/** Two kept runs side by side: who entered and left the list, who moved and why, what of data, methods and settings differs. */
import { kendallTauB } from '../engineering/numeric/kendall.js';
import { changeParts, rankMoves } from '../engineering/priority/compare.js';
import type { ChangeParts, RankMove } from '../engineering/priority/compare.js';
import { roundedMedian } from '../engineering/priority/rank.js';
import { changesBetween } from '../study/changes.js';
import { dotted } from '../study/problems.js';
import { inputChanges } from './compare-inputs.js';
import type { FieldCount, InputChange } from './compare-inputs.js';
import { readCompared } from './read-compared.js';
import type { ComparedRun, ComparedSide, LeadingSide, RunOf } from './read-compared.js';
import { studyKeyOf } from './setting-keys.js';

/** A building in one of the two runs, as a list of places names it. */
export interface OneSided {
  readonly id: string;
  readonly name: string | null;
  /** null where it was not ranked. */
  readonly rank: number | null;
}

/** Why a building stands where it stands now. */
export interface ExplainedMove {
  readonly id: string;
  readonly name: string | null;
  readonly rank_before: number | null;
  readonly rank: number | null;
  readonly listed_before: boolean;
  readonly listed: boolean;
  readonly chance_before: number;
  readonly chance: number;
  /** It is in one inventory only. */
  readonly came: boolean;
  readonly went: boolean;
  /** Reason why it is not ranked on the side where it is not. */
  readonly not_ranked: string | null;
  /** Change of ln S and its parts, which add to it; of buildings ranked in both runs. */
  readonly change: number | null;
  readonly parts: ChangeParts | null;
  /** The move in rank, by whose change; of buildings ranked in both runs. */
  readonly move: RankMove | null;
  readonly before: LeadingSide | null;
  readonly after: LeadingSide | null;
  readonly inputs: readonly InputChange[];
}

export interface SettingChange {
  /** The study's key of it, dotted; where the study states none, that key's place. */
  readonly path: string;
  /** null where it is not there. */
  readonly before: unknown;
  readonly after: unknown;
}

export interface Comparison {
  readonly before: ComparedRun;
  readonly after: ComparedRun;
  /** Settings that differ, by path. */
  readonly settings: readonly SettingChange[];
  /** Which of program, methods, study and inventory have another fingerprint. */
  readonly differs: {
    readonly program: boolean;
    readonly methods: boolean;
    readonly study: boolean;
    readonly inventory: boolean;
  };
  readonly list: {
    /** Buildings on both lists. */
    readonly overlap: number;
    readonly places_before: number;
    readonly places: number;
    /** By rank now, and by rank before. */
    readonly entered: readonly string[];
    readonly left: readonly string[];
  };
  /** Buildings ranked in both runs, how many of them stand at another rank, Kendall's tau-b of their ln S, the change common to them. */
  readonly ranked_both: number;
  readonly moved: number;
  readonly tau_b: number | null;
  readonly common_change: number | null;
  readonly data: {
    /** Buildings only in the later inventory, and only in the earlier, by rank. */
    readonly came: readonly OneSided[];
    readonly went: readonly OneSided[];
    readonly in_both: number;
    readonly changed: number;
    readonly fields: readonly FieldCount[];
  };
  /** The buildings of both lists by rank now, then the largest other moves. */
  readonly buildings: readonly ExplainedMove[];
}

export interface CompareOptions {
  /** Buildings explained besides those of the lists: the largest moves; 20 when left out. */
  readonly most?: number;
}

/** Compares run `before` with run `after`, of one database or two. @throws UserError for an unknown run. */
export async function compareRuns(
  before: RunOf,
  after: RunOf,
  { most = 20 }: CompareOptions = {},
): Promise<Comparison> {
  const [a, b] = [await readCompared(before), await readCompared(after)];
  const { common, moves } = rankMoves(a.ladder, b.ladder);
  const inputs = await inputChanges(a, b);
  const lists = compareLists(a, b);
  const listed = [...new Set([...listIds(b), ...lists.left])];
  const onLists = new Set(listed);
  const others = [...moves]
    .filter(([id, move]) => move.rank !== move.rank_before && !onLists.has(id))
    .sort(([, x], [, y]) => Math.abs(y.rank - y.rank_before) - Math.abs(x.rank - x.rank_before) || x.rank - y.rank)
    .slice(0, most)
    .map(([id]) => id);
  let moved = 0;
  for (const { rank, rank_before } of moves.values()) if (rank !== rank_before) moved += 1;
  const both = [...moves.keys()];
  const values = ({ indexOf, lnPriority }: ComparedSide): Float64Array =>
    Float64Array.from(both, (id) => roundedMedian(lnPriority[indexOf.get(id)!]!));
  const tau = kendallTauB(values(a), values(b));
  return {
    before: a.entry,
    after: b.entry,
    settings: settingChanges(a, b),
    differs: {
      program: a.entry.program !== b.entry.program,
      methods: a.entry.fingerprints.methods !== b.entry.fingerprints.methods,
      study: a.entry.fingerprints.study !== b.entry.fingerprints.study,
      inventory: a.entry.fingerprints.inventory !== b.entry.fingerprints.inventory,
    },
    list: lists,
    ranked_both: moves.size,
    moved,
    tau_b: Number.isNaN(tau) ? null : tau,
    common_change: Number.isNaN(common) ? null : common,
    data: {
      came: oneSided(b, a),
      went: oneSided(a, b),
      in_both: b.id.filter((id) => a.indexOf.has(id)).length,
      changed: inputs.byId.size,
      fields: inputs.fields,
    },
    buildings: [...listed, ...others].map((id) =>
      explained(id, a, b, moves.get(id) ?? null, inputs.byId.get(id) ?? []),
    ),
  };
}

/** Identifiers of the list, first place first. */
function listIds({ ladder, entry }: ComparedSide): readonly string[] {
  return ladder.id.slice(0, entry.list_size);
}

function compareLists(a: ComparedSide, b: ComparedSide): Comparison['list'] {
  const [was, now] = [listIds(a), listIds(b)];
  const [inWas, inNow] = [new Set(was), new Set(now)];
  const entered = now.filter((id) => !inWas.has(id));
  return {
    overlap: now.length - entered.length,
    places_before: was.length,
    places: now.length,
    entered,
    left: was.filter((id) => !inNow.has(id)),
  };
}

/** Buildings of `side` that `other` does not have, by rank, those not ranked last. */
function oneSided(side: ComparedSide, other: ComparedSide): readonly OneSided[] {
  const place = (rank: number | null): number => rank ?? Infinity;
  return side.id
    .flatMap((id, at): OneSided[] =>
      other.indexOf.has(id) ? [] : [{ id, name: side.name[at]!, rank: rankAt(side, at) }],
    )
    .sort((x, y) => (place(x.rank) === place(y.rank) ? (x.id < y.id ? -1 : 1) : place(x.rank) - place(y.rank)));
}

function rankAt({ rank }: ComparedSide, at: number): number | null {
  return rank[at]! > 0 ? rank[at]! : null;
}

function explained(
  id: string,
  a: ComparedSide,
  b: ComparedSide,
  move: RankMove | null,
  inputs: readonly InputChange[],
): ExplainedMove {
  const [was, now] = [a.indexOf.get(id), b.indexOf.get(id)];
  const rankBefore = was === undefined ? null : rankAt(a, was);
  const rank = now === undefined ? null : rankAt(b, now);
  const before = was === undefined || rankBefore === null ? null : a.leading(was);
  const after = now === undefined || rank === null ? null : b.leading(now);
  const parts = before === null || after === null ? null : changeParts(before, after);
  return {
    id,
    name: (now === undefined ? a.name[was ?? -1] : b.name[now]) ?? null,
    rank_before: rankBefore,
    rank,
    listed_before: rankBefore !== null && rankBefore <= a.entry.list_size,
    listed: rank !== null && rank <= b.entry.list_size,
    chance_before: was === undefined ? NaN : a.chance[was]!,
    chance: now === undefined ? NaN : b.chance[now]!,
    came: was === undefined,
    went: now === undefined,
    not_ranked:
      now === undefined ? null : (b.notRanked[now] ?? (was === undefined ? null : (a.notRanked[was] ?? null))),
    change: before === null || after === null ? null : after.ln_priority - before.ln_priority,
    parts,
    move,
    before,
    after,
    inputs,
  };
}

/** What the kept settings say otherwise; list size and seed are kept beside them. */
function settingChanges(a: ComparedSide, b: ComparedSide): readonly SettingChange[] {
  const of = ({ settings, entry, seed }: ComparedSide): unknown => ({ ...settings, listSize: entry.list_size, seed });
  return changesBetween(of(a), of(b)).map(({ path, from, to }) => ({
    path: dotted(studyKeyOf(path)),
    before: from ?? null,
    after: to ?? null,
  }));
}
