/** A plausible page: about sixty buildings, all invented here, assessed by the real engineering and ranked by a plain stand-in. */
import { buildingAt, BUILDING_NUMBERS, BUILDING_WORDS } from '../../src/engineering/building-columns.js';
import type { BuildingColumns } from '../../src/engineering/building-columns.js';
import { assess, isRanked } from '../../src/engineering/assess/assess.js';
import type { Assessment, NotRanked } from '../../src/engineering/assess/assess.js';
import { closenessOf, swayOf } from '../../src/engineering/assess/neighbours.js';
import { compileContext } from '../../src/engineering/assess/context.js';
import { IRREGULARITY, SPREADS } from '../../src/engineering/assess/settings.js';
import type { AssessSettings } from '../../src/engineering/assess/settings.js';
import { normalCdf } from '../../src/engineering/numeric/normal.js';
import type {
  GapPair,
  PageBuildings,
  PageData,
  PageGaps,
  PageSummary,
  Site,
} from '../../src/engineering/page-contract.js';
import { siteFigures } from '../../src/engineering/priority/sites.js';
import { RESULT_COLUMNS } from '../../src/engineering/results.js';
import { SURE } from '../../src/screening/summarise.js';

type Row = Record<string, number | string | null>;
type NumberName = (typeof BUILDING_NUMBERS)[number];
type WordName = (typeof BUILDING_WORDS)[number];

export const HOSTILE_NAME = '</script><img src=x onerror=alert(1)>';

/** Invented settings: one place, two site classes, two levels. */
export const SETTINGS: AssessSettings = {
  spectra: {
    'design-c': { code: 'asce7-22-two-period', sds_g: 0.8, sd1_g: 0.4, tl_s: 8, return_period_years: 475 },
    'design-d': { code: 'asce7-22-two-period', sds_g: 0.86, sd1_g: 0.62, tl_s: 8, return_period_years: 475 },
    'rare-c': { code: 'asce7-22-two-period', sds_g: 1.5, sd1_g: 0.8, tl_s: 8, return_period_years: 2475 },
    'rare-d': { code: 'asce7-22-two-period', sds_g: 1.42, sd1_g: 1.15, tl_s: 8, return_period_years: 2475 },
  },
  levels: [
    { title: 'design level', by: 'site_class', spectra: { C: 'design-c', D: 'design-d' }, otherwise: 'design-d' },
    { title: 'rare level', by: 'site_class', spectra: { C: 'rare-c', D: 'rare-d' }, otherwise: 'rare-d' },
  ],
  holdPlateau: true,
  period: { standard: 'asce41-17', basis: 'best-fit', formulaFor: {}, switchedOff: [] },
  codeHistory: {
    place: 'Example Bay (invented)',
    seismic_design_enforced_from: 1952,
    adoption_lag_years: 2,
    editions: {
      'ubc-1949': { zone: 3 },
      'ubc-1961': { zone_factor: 1 },
      'ubc-1976': { zone_factor: 1, site_factor: 1.5 },
      'ubc-1988': { zone_factor: 0.4, site_factor: 1.2 },
      'ubc-1997': { ca_g: 0.44, cv_g: 0.64, zone_factor: 0.4, nv: 1 },
      'asce7-2002': { sds_g: 0.85, sd1_g: 0.5, s1_g: 0.6 },
    },
  },
  systemPrior: [
    {
      use: null,
      storeysFrom: null,
      storeysTo: null,
      builtFrom: null,
      builtTo: null,
      label: 'any use (invented)',
      chances: [
        { system: 'timber-light-frame', chance: 0.4 },
        { system: 'unreinforced-masonry-wall', chance: 0.25 },
        { system: 'concrete-shear-wall', chance: 0.2 },
        { system: 'concrete-moment-frame', chance: 0.15 },
      ],
    },
  ],
  rankBy: 'people',
  slope: { 'design-c': 2.6, 'design-d': 3.1 },
  slopeSource: 'two levels',
  spreads: SPREADS,
  irregularity: IRREGULARITY,
};

/** The numeric recipe of a linear congruential generator, enough for invented rows. */
function draws(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

const STREETS = ['Cooper Row', 'Saltpan Lane', 'Old Ropewalk', 'Mill Terrace', 'College Green', 'Ferry Steps'];
const SYSTEM_WORDS = [
  'unreinforced-masonry-wall',
  'timber-light-frame',
  'concrete-moment-frame',
  'concrete-shear-wall',
  'steel-moment-frame',
  'reinforced-masonry-wall',
  'concrete-infilled-frame',
  null,
  null,
];
const USE_WORDS = ['residential', 'office', 'school', 'retail', 'hotel', 'warehouse', 'laboratory', 'residential'];

function inventedRow(i: number, next: () => number): Row {
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)] as T;
  const storeys = 1 + Math.floor(next() ** 2 * 11);
  const heightGiven = next() < 0.55;
  const year = 1890 + Math.floor(next() * 130);
  const system = pick(SYSTEM_WORDS);
  const measured = i % 11 === 4;
  const stiff = i % 13 === 6;
  return {
    id: `EX-${String(i + 1).padStart(3, '0')}`,
    name: i === 7 ? HOSTILE_NAME : i % 9 === 5 ? null : `${String(2 * i + 1)} ${pick(STREETS)}`,
    group: STREETS[Math.floor(i / 10)] ?? null,
    lon: -40.02 + (i % 10) * 0.0011 + Math.floor(i / 600) * 0.012 + next() * 0.0004,
    lat: 35.01 + (Math.floor(i / 10) % 60) * 0.0012 + next() * 0.0004,
    heritage: i % 17 === 3 ? 'yes' : null,
    status: i === 20 ? 'assessed' : 'in-use',
    storeys_above: storeys,
    storeys_above_sigma: 0,
    storeys_above_origin: 'given',
    height_m: storeys * (3 + next() * 0.6) + 0.4,
    height_m_sigma: heightGiven ? 0 : 0.15,
    height_m_origin: heightGiven ? 'given' : 'inferred',
    height_m_rule: heightGiven ? null : 'storeys times storey height of the use',
    plan_length_m: 14 + next() * 40,
    plan_width_m: 9 + next() * 12,
    floor_area_m2: storeys * (180 + next() * 600),
    floor_area_m2_sigma: 0,
    floor_area_m2_origin: 'given',
    year_built: i % 10 === 9 ? NaN : year,
    year_pool: i % 10 === 9 ? 1 : NaN,
    year_built_origin: i % 10 === 9 ? 'inferred' : 'given',
    system,
    use: pick(USE_WORDS),
    occupants_peak: next() < 0.2 ? Math.round(20 + next() * 400) : NaN,
    measured_period_longitudinal_s: measured ? 0.09 * storeys + 0.1 : NaN,
    measured_period_transverse_s: measured ? 0.1 * storeys + 0.1 : NaN,
    measured_amplitude: measured ? 'ambient' : null,
    seismic_weight_kN: stiff ? storeys * 4200 : NaN,
    storey_stiffness_longitudinal_kN_per_m: stiff ? '310000' : null,
    storey_stiffness_transverse_kN_per_m: stiff ? '240000' : null,
    soft_storey: i % 7 === 2 ? 'yes' : null,
    site_class: i % 4 === 0 ? null : i % 4 === 1 ? 'C' : 'D',
    first_row: i + 2,
  };
}

function columnsOf(rows: readonly Row[]): BuildingColumns {
  const numbers = Object.fromEntries(
    BUILDING_NUMBERS.map((name) => [name, rows.map((row) => (typeof row[name] === 'number' ? row[name] : NaN))]),
  ) as Record<NumberName, number[]>;
  const words = Object.fromEntries(
    BUILDING_WORDS.map((name) => [name, rows.map((row) => (typeof row[name] === 'string' ? row[name] : null))]),
  ) as Record<WordName, (string | null)[]>;
  return { id: rows.map((row) => String(row['id'])), numbers, words };
}

/** Rank, chance and band of every assessed building: threshold by bisection, normal distributions throughout. */
function rankRows(assessed: readonly Assessment[], listSize: number): Row[] {
  const chanceAbove = (a: Assessment, t: number): number =>
    1 - normalCdf((t - a.lnPriority) / Math.max(a.lnPrioritySd, 1e-9));
  const size = Math.min(listSize, assessed.length);
  let [low, high] = [-60, 60];
  for (let halving = 0; halving < 80; halving += 1) {
    const middle = (low + high) / 2;
    if (assessed.reduce((sum, a) => sum + chanceAbove(a, middle), 0) > size) low = middle;
    else high = middle;
  }
  const step = Math.max(1, Math.floor(assessed.length / 200));
  const sampled = assessed.filter((_, i) => i % step === 0);
  const expectedRank = (t: number): number =>
    Math.min(
      assessed.length,
      Math.max(1, Math.round(sampled.reduce((sum, b) => sum + step * chanceAbove(b, t), 0) + 0.5)),
    );
  const byDemand = [...assessed].sort((a, b) => b.demand_g - a.demand_g || (a.id < b.id ? -1 : 1));
  const demandRank = new Map(byDemand.map((a, i) => [a.id, i + 1]));
  const middle = assessed[assessed.length >> 1]?.lnPriority ?? 0;
  return assessed.map((a, i) => ({
    rank: i + 1,
    in_list: i < listSize ? 'yes' : 'no',
    chance: size >= assessed.length ? 1 : chanceAbove(a, low),
    rank_best: expectedRank(a.lnPriority + 1.645 * a.lnPrioritySd),
    rank_worst: expectedRank(a.lnPriority - 1.645 * a.lnPrioritySd),
    tie_group: Math.floor(i / 6) + 1,
    priority: Math.exp(a.lnPriority - middle),
    ln_priority: a.lnPriority,
    ln_priority_sd: a.lnPrioritySd,
    demand_rank: demandRank.get(a.id) ?? NaN,
    governing: a.leading.governing,
    period_longitudinal_s: a.period.longitudinal.p50_s,
    period_longitudinal_16_s: a.period.longitudinal.p16_s,
    period_longitudinal_84_s: a.period.longitudinal.p84_s,
    period_transverse_s: a.period.transverse.p50_s,
    period_transverse_16_s: a.period.transverse.p16_s,
    period_transverse_84_s: a.period.transverse.p84_s,
    period_evidence: a.leading.evidence,
    sa_g: a.leading.sa_g,
    sa_level_2_g: a.leading.sa_level_2_g,
    capacity_g: a.leading.capacity_g,
    demand_over_capacity: a.leading.demand_over_capacity,
    people_exposed: a.people_exposed,
    slope_k: a.slope_k,
    spectrum: a.spectrum,
    case_system: a.leading.system,
    case_edition: a.leading.edition ?? 'no seismic design',
    case_chance: a.leading.chance,
    weak_type: a.weakType,
    weak_chance: a.weakChance,
    flags: a.flags.join(' '),
    not_ranked: null,
  }));
}

export interface PageDataOptions {
  readonly count?: number;
  readonly listSize?: number;
  readonly coordinates?: boolean;
  readonly display?: PageData['display'];
}

/** Invented page data: `count` buildings (60 unless told), one of them with a hostile name, one not ranked. */
export function pageData({
  count = 60,
  listSize = 12,
  coordinates = true,
  display = 'si',
}: PageDataOptions = {}): PageData {
  const next = draws(7);
  const raw = Array.from({ length: count }, (_, i) => inventedRow(i, next));
  const pools = { 1: [1905, 1921, 1938, 1954, 1967] };
  const context = compileContext(SETTINGS);
  const columns = columnsOf(raw);
  const outcome = raw.map((row, i) => ({ row, result: assess(buildingAt(columns, i, pools), context) }));
  const ranked = outcome
    .filter((entry): entry is { row: Row; result: Assessment } => isRanked(entry.result))
    .sort((a, b) => b.result.lnPriority - a.result.lnPriority);
  const others = outcome.filter((entry): entry is { row: Row; result: NotRanked } => !isRanked(entry.result));
  const rows = [...ranked, ...others].map(({ row }) => row);
  const blank = Object.fromEntries(RESULT_COLUMNS.map(({ name }) => [name, null])) as Row;
  const results: Row[] = [
    ...rankRows(
      ranked.map(({ result }) => result),
      listSize,
    ),
    ...others.map(({ result }) => ({ ...blank, in_list: 'no', not_ranked: result.reason })),
  ];
  const text = (name: string): (string | null)[] => rows.map((row) => (row[name] ?? null) as string | null);
  const place = (name: string): (number | null)[] => rows.map((row) => (coordinates ? (row[name] as number) : null));
  const buildings: PageBuildings = {
    shown: rows.length,
    all: rows.length,
    inputs: columnsOf(rows),
    pools,
    name: text('name'),
    group: text('group'),
    part_of: rows.map((_, i) => (SITE.slice(1).includes(i) ? (rows[SITE[0]!]?.['id'] as string) : null)),
    site: rows.map((_, i) => (hasSite(rows.length) && SITE.includes(i) ? 0 : null)),
    lon: place('lon'),
    lat: place('lat'),
    heritage: text('heritage'),
    first_row: rows.map((row) => row['first_row'] as number),
    found: Object.fromEntries(
      rows
        .filter((row) => row['height_m_origin'] === 'given')
        .slice(0, 1)
        .map((row) => [row['id'] as string, { height_m: 'street visit of 2026-05-03' }]),
    ),
    results: Object.fromEntries(RESULT_COLUMNS.map(({ name }) => [name, results.map((row) => row[name] ?? null)])),
  };
  return {
    summary: summaryOf(rows, results, ranked.length, listSize),
    settings: SETTINGS,
    buildings,
    sites: hasSite(rows.length) ? { all: 1, buildings: SITE.length, sites: [siteOf(rows, results)] } : NO_SITES,
    gaps: gapsOfRows(rows, results, (i) => swayOf(buildingAt(buildings.inputs, i, pools), context)),
    grids: {},
    display,
  };
}

/** Places of neighbours, gap, what the table says of floors; the last is wide enough. */
const PAIRS = [
  [0, 1, 0, 'no'],
  [0, 4, 0.01, null],
  [4, 9, 0.02, 'yes'],
  [9, 12, 1.9, null],
] as const;

function gapsOfRows(
  rows: readonly Row[],
  results: readonly Row[],
  sway: (i: number) => ReturnType<typeof swayOf>,
): PageGaps {
  const pairs = PAIRS.filter(([, b]) => b < rows.length).flatMap(([a, b, gap_m, floors_aligned]): GapPair[] => {
    const [one, other] = [sway(a), sway(b)];
    if (one === null || other === null) return [];
    const found = closenessOf(one, other, { gap_m, floors_aligned, how: 'given' });
    const name = (i: number): string | null => rows[i]?.['name'] as string | null;
    const rank = (i: number): number | null => results[i]?.['rank'] as number | null;
    return [
      {
        id_a: one.id,
        id_b: other.id,
        name_a: name(a),
        name_b: name(b),
        rank_a: rank(a),
        rank_b: rank(b),
        gap_m,
        gap_from: 'given',
        floors_aligned,
        needed_m: found.needed_m,
        double_difference_m: found.double_difference_m,
        by_height_m: found.by_height_m,
        much_taller: found.muchTaller,
      },
    ];
  });
  const short = pairs.filter(({ gap_m, needed_m, by_height_m }) => gap_m < needed_m || gap_m < by_height_m).length;
  return { of: 'all', first: null, complete: true, alike: 0, unknown: 0, pairs, short };
}

/** Places of a main building and what is joined to it, the last of them not ranked in sixty. */
const SITE: readonly number[] = [4, 9, 30, 59];
const NO_SITES = { all: 0, buildings: 0, sites: [] };
const hasSite = (count: number): boolean => count > SITE.at(-1)!;

function siteOf(rows: readonly Row[], results: readonly Row[]): Site {
  const take = (name: string): number[] => SITE.map((i) => (results[i]?.[name] ?? NaN) as number);
  const { ranked, bestRank, chance, expected, people } = siteFigures(
    { rank: take('rank'), chance: take('chance'), people: take('people_exposed') },
    0,
    SITE.length,
  );
  const members = SITE.map((i) => ({
    id: rows[i]?.['id'] as string,
    name: rows[i]?.['name'] as string | null,
    rank: results[i]?.['rank'] as number | null,
    chance: results[i]?.['chance'] as number | null,
    not_ranked: results[i]?.['not_ranked'] as string | null,
  }));
  const { id, name } = members[0]!;
  return {
    id,
    name,
    buildings: SITE.length,
    ranked,
    best_rank: bestRank,
    chance,
    expected_in_list: expected,
    people_exposed: people,
    members,
  };
}

function summaryOf(rows: readonly Row[], results: readonly Row[], ranked: number, listSize: number): PageSummary {
  const listed = results.slice(0, Math.min(listSize, ranked));
  const chance = (row: Row): number => row['chance'] as number;
  const unknown = rows.filter((row) => row['system'] === null).length;
  const all = rows.length;
  const inferred = rows.filter((row) => row['height_m_origin'] === 'inferred').length;
  return {
    title: 'Example Bay (invented)',
    run: '1',
    made: '2026-06-11T09:30:00Z',
    program: 'swaymark 0.1.0',
    rows_in: all + 3,
    buildings: all,
    ranked,
    list_size: listSize,
    expected_wrong_places: listed.reduce((sum, row) => sum + 1 - chance(row), 0),
    sure_places: listed.filter((row) => chance(row) >= SURE).length,
    largest_equal_block: 1,
    tie_group_at_edge: { from: Math.max(1, listSize - 3), to: listSize + 4 },
    weak_in_list: listed.filter((row) => row['weak_type'] !== null).length,
    weak_outside: results.slice(listSize).filter((row) => row['weak_type'] !== null).length,
    rank_by: 'people',
    fingerprints: { study: '3f9a51c0d2e84b77', inventory: 'c41be7709a5512fe', methods: '90d1f3ab66c2e815' },
    account: [
      { kind: 'ranked', title: 'Rows merged into ranked buildings', rows: ranked },
      { kind: 'not-ranked', title: 'Rows merged into buildings not ranked', rows: all - ranked },
      { kind: 'rejected', title: 'Rejected rows', rows: 2 },
      { kind: 'duplicate', title: 'Exact duplicates', rows: 1 },
    ],
    attributes: [
      { attribute: 'storeys_above', title: 'Storeys above ground', given: all, inferred: 0, default: 0, unknown: 0 },
      { attribute: 'height_m', title: 'Height', given: all - inferred, inferred, default: 0, unknown: 0 },
      { attribute: 'year_built', title: 'Year built', given: all - 6, inferred: 6, default: 0, unknown: 0 },
      { attribute: 'system', title: 'Lateral system', given: all - unknown, inferred: 0, default: 0, unknown },
      { attribute: 'site_class', title: 'Site class', given: all - 15, inferred: 0, default: 15, unknown: 0 },
    ],
    not_ranked: [...new Set(results.map((row) => row['not_ranked']))].flatMap((reason) =>
      typeof reason === 'string'
        ? [{ reason, count: results.filter((row) => row['not_ranked'] === reason).length }]
        : [],
    ),
    findings: [
      {
        code: 'height-per-storey',
        kind: 'flag',
        count: 2,
        example: 'row 14: height 61 m for 4 storeys is 15.3 m a storey; 2.3 to 6.5 m is usual',
      },
      {
        code: 'outside-limits',
        kind: 'reject',
        count: 2,
        example: 'row 63, column "Height (m)": 1200 is outside 2 to 320 m',
      },
    ],
    assumptions: [
      {
        id: 'overstrength',
        statement: 'Strength beyond the design coefficient',
        value: 'factor 2.0',
        source: 'judgement',
      },
      {
        id: 'adoption-lag',
        statement: 'Years between the print of a code and its use',
        value: '2 years',
        source: 'judgement',
      },
      {
        id: 'system-prior',
        statement: 'Chances of a system where it is not known',
        value: 'one table',
        source: 'invented for this example',
      },
    ],
    level_of_work: 'Desk screening: Swaymark itself visited nothing.',
    cautions: [
      'Desk screening: Swaymark itself visited nothing.',
      'This is an order for further assessment, not a statement about safety.',
      'A low rank is not clearance.',
      'Ranks inside a tie group cannot be told apart.',
      'Shaking only: no liquefaction, landslide, fault rupture, tsunami, fire or non-structural damage.',
      'Not for decisions on occupancy, insurance, lending or valuation.',
      'Local codes and a licensed engineer decide.',
    ],
    slopes: [
      { spectrum: 'design-c', k: 2.6, how: 'from two levels' },
      { spectrum: 'design-d', k: 3.1, how: 'from two levels' },
    ],
  };
}
