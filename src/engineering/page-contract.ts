/** What the dashboard page carries: filled by screening, drawn by reports, read by the page's script. */
import type { AssessSettings } from './assess/settings.js';
import type { SpreadShare } from './assess/spread-shares.js';
import type { BuildingColumns, YearPools } from './building-columns.js';
import type { BudgetOutlook, SensitivityOutlook, SurveyOutlook } from './page-outlook.js';
import type { CarriedGrid } from './spectrum/grid-carry.js';
import type { FoundBy } from './trace.js';

/** Where a portfolio's values come from, counted per attribute. */
export interface AttributeCount {
  readonly attribute: string;
  readonly title: string;
  readonly given: number;
  readonly inferred: number;
  readonly default: number;
  readonly unknown: number;
}

export interface AccountLine {
  readonly kind: string;
  readonly title: string;
  readonly rows: number;
}

export interface FindingCount {
  readonly code: string;
  readonly kind: string;
  readonly count: number;
  /** Whose cells they are, where cells were not read. */
  readonly column?: string;
  /** One message as an example, with its row. */
  readonly example: string;
}

export interface ReasonCount {
  readonly reason: string;
  readonly count: number;
}

export interface Assumption {
  readonly id: string;
  readonly statement: string;
  readonly value: string;
  readonly source: string;
}

export type { SurveyVisit, SurveyOutlook, SensitivityOutlook, BudgetOutlook } from './page-outlook.js';

/** The ordinates of a hazard grid over the ranked buildings that read it. */
export interface GridSpread {
  readonly spectrum: string;
  /** Buildings behind the quantiles: all, or of a large inventory some thousands spread evenly over it. */
  readonly buildings: number;
  readonly periods_s: readonly number[];
  /** Period by period, g: 5th percentile, median, 95th percentile. */
  readonly low_g: readonly number[];
  readonly median_g: readonly number[];
  readonly high_g: readonly number[];
}

/** A main building with the wings and additions joined to it. */
export interface Site {
  /** Of its main building. */
  readonly id: string;
  readonly name: string | null;
  readonly buildings: number;
  readonly ranked: number;
  /** Null where none is ranked, as the two that follow. */
  readonly best_rank: number | null;
  /** Chance that at least one member belongs to the list. */
  readonly chance: number | null;
  readonly expected_in_list: number | null;
  /** People present on average in the members of which it is known; null where it is known of none. */
  readonly people_exposed: number | null;
  /** By rank, those not ranked last; of a very large site the first. */
  readonly members: readonly SiteMember[];
}

export interface SiteMember {
  readonly id: string;
  readonly name: string | null;
  readonly rank: number | null;
  readonly chance: number | null;
  /** Why it is not ranked. */
  readonly not_ranked: string | null;
}

/** Sites of two buildings or more, those likeliest to have one in the list first. */
export interface PageSites {
  /** Of the whole inventory, with the buildings that belong to them. */
  readonly all: number;
  readonly buildings: number;
  /** Those of the shown buildings. */
  readonly sites: readonly Site[];
}

/** The gap between two neighbours against what they may sway together. */
export interface GapPair {
  readonly id_a: string;
  readonly id_b: string;
  readonly name_a: string | null;
  readonly name_b: string | null;
  /** Null: not ranked. */
  readonly rank_a: number | null;
  readonly rank_b: number | null;
  readonly gap_m: number;
  /** In the table of neighbours, or measured between the footprints. */
  readonly gap_from: 'given' | 'measured';
  readonly floors_aligned: 'yes' | 'no' | null;
  /** By the root of the squares, of which 0.7 where floors are at one level. */
  readonly needed_m: number;
  readonly double_difference_m: number;
  readonly by_height_m: number;
  /** One is half as tall again as the other, or more. */
  readonly much_taller: boolean;
}

/** What of a pair travels to the page. */
export const GAP_COLUMNS = [
  'id_a',
  'id_b',
  'gap_m',
  'gap_from',
  'floors_aligned',
  'needed_m',
  'double_difference_m',
  'by_height_m',
  'much_taller',
] as const satisfies readonly (keyof GapPair)[];

export interface PageGaps {
  /** Worked for every building, or in a large inventory for those of the list alone. */
  readonly of: 'all' | 'list';
  /** Of the list, where it is long, the first so many; null: all that `of` says. */
  readonly first: number | null;
  /** False where outlines overlap in such masses that pairs are missing. */
  readonly complete: boolean;
  /** Pairs passed over because both have the same outline. */
  readonly alike: number;
  /** Pairs of which one building cannot be worked, so that what they need is not known. */
  readonly unknown: number;
  /** All others within reach, those that lack most first; of which `short` are short by what both sway or by the height rule. */
  readonly pairs: readonly GapPair[];
  readonly short: number;
}

export interface PageSummary {
  readonly title: string;
  readonly run: string;
  /** When the run was made, ISO 8601, from the run's record. */
  readonly made: string;
  readonly program: string;
  readonly rows_in: number;
  readonly buildings: number;
  readonly ranked: number;
  readonly list_size: number;
  readonly expected_wrong_places: number;
  /** Holds the number of wrong places with a chance of 90 %; not in runs of earlier versions. */
  readonly wrong_places_range?: { readonly low: number; readonly high: number } | undefined;
  readonly sure_places: number;
  readonly largest_equal_block: number;
  readonly tie_group_at_edge: { readonly from: number; readonly to: number };
  readonly weak_in_list: number;
  readonly weak_outside: number;
  /** Why buildings are not ranked, the commonest reason first. */
  readonly not_ranked: readonly ReasonCount[];
  readonly rank_by: string;
  readonly fingerprints: { readonly study: string; readonly inventory: string; readonly methods: string };
  readonly account: readonly AccountLine[];
  readonly attributes: readonly AttributeCount[];
  readonly findings: readonly FindingCount[];
  readonly assumptions: readonly Assumption[];
  /** What was looked at before the ranking and what was not; the first of the cautions. */
  readonly level_of_work: string;
  readonly cautions: readonly string[];
  /** Left out where none was planned with the run. */
  readonly survey?: SurveyOutlook | null;
  /** Of each listed building, the first place first, what its priority is most uncertain by, and of what a visit can find out; left out where none was asked. */
  readonly doubts?: readonly (readonly SpreadShare[])[] | undefined;
  /** What the study's money buys, and what the list hangs on; not in runs of earlier versions, null for large inventories. */
  readonly budget?: BudgetOutlook | null | undefined;
  readonly sensitivity?: SensitivityOutlook | null | undefined;
  /** Slope of the hazard curve per spectrum of the ranking level. */
  readonly slopes: readonly { readonly spectrum: string; readonly k: number; readonly how: string }[];
  /** Grids that the first two levels read; none in runs made before there were any. */
  readonly grids?: readonly GridSpread[] | undefined;
}

/**
 * Buildings in rank order, those not ranked last. `shown` may be fewer than all (the largest ranks first); then the page says
 * so and names ranking.csv.
 */
export interface PageBuildings {
  readonly shown: number;
  readonly all: number;
  /** Inputs, for the hand calculation made in the page. */
  readonly inputs: BuildingColumns;
  readonly pools: YearPools;
  readonly name: readonly (string | null)[];
  readonly group: readonly (string | null)[];
  readonly part_of: readonly (string | null)[];
  /** Place of its site in the list of sites; null: it stands by itself. */
  readonly site: readonly (number | null)[];
  readonly lon: readonly (number | null)[];
  readonly lat: readonly (number | null)[];
  readonly heritage: readonly (string | null)[];
  readonly first_row: readonly number[];
  /** Every column of results.ts by its name. */
  readonly results: Readonly<Record<string, readonly (number | string | null)[]>>;
  /** What surveys found of the buildings shown, by id; only those with answers. */
  readonly found: Readonly<Record<string, FoundBy>>;
}

export interface PageData {
  readonly summary: PageSummary;
  readonly settings: AssessSettings;
  readonly buildings: PageBuildings;
  readonly sites: PageSites;
  /** Null where neither footprints nor a table of neighbours tell of any gap. */
  readonly gaps: PageGaps | null;
  /** What the shown buildings read of the study's grids, by fingerprint. */
  readonly grids: Readonly<Record<string, CarriedGrid>>;
  readonly display: 'si' | 'us';
}
