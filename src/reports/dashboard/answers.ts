/** Sentences computed from the data, shared by page and summary. */
import { findColumn } from '../../engineering/columns.js';
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import type { AttributeCount, PageData, PageSummary } from '../../engineering/page-contract.js';
import { SURE } from '../../screening/summarise.js';
import { outlookSentence } from '../survey/words.js';
import { counted, listLength } from './reading.js';

const ORDER_OF: Readonly<Record<string, string>> = {
  people: 'how often shaking is expected to exceed what the building can take, times the people inside',
  ratio: 'how often shaking is expected to exceed what the building can take',
  demand: 'the acceleration that the building’s own period draws from the design spectrum',
};

/** What the order means, in words. */
export function orderSentence({ summary }: PageData): string {
  return `Buildings are ordered by ${ORDER_OF[summary.rank_by] ?? summary.rank_by}.`;
}

/** What the run says, in one or two sentences a council understands. */
export function answerSentence(data: PageData): string {
  const { summary } = data;
  const places = listLength(data);
  if (places === 0) return 'No building could be ranked, so there is no list; the reasons stand with each building.';
  if (summary.ranked <= summary.list_size) {
    const all = summary.ranked === 1 ? 'The only ranked building fits' : `All ${formatCount(summary.ranked)} ranked buildings fit`;
    return `${all} the list of ${formatCount(summary.list_size)}, so the list decides nothing yet; the order within it still tells where to begin.`;
  }
  const wrong = Math.round(summary.expected_wrong_places);
  const wrongly =
    summary.expected_wrong_places < 0.5
      ? 'fewer than one is expected to be wrong'
      : `about ${formatCount(wrong)}${rangeWords(summary)} ${wrong === 1 ? 'is' : 'are'} expected to be wrong`;
  const sure = summary.sure_places === 0 ? 'none is sure' : `${formatCount(summary.sure_places)} ${summary.sure_places === 1 ? 'is' : 'are'} sure`;
  return `${places === 1 ? 'Of the one building' : `Of the ${formatCount(places)} buildings`} listed, out of ${formatCount(summary.ranked)} ranked, ${sure} and ${wrongly}${unknownClause(summary.attributes)}.`;
}

/** Runs of earlier versions kept no range. */
function rangeWords({ wrong_places_range: range }: PageSummary): string {
  return range === undefined || range.low === range.high
    ? ''
    : ` (${formatCount(range.low)} to ${formatCount(range.high)})`;
}

function unknownClause(attributes: readonly AttributeCount[]): string {
  const system = attributes.find(({ attribute }) => attribute === 'system');
  if (system === undefined) return '';
  const share = shareNotGiven(system);
  if (share === 0) return '; the lateral system of every building is on record';
  return `; for ${formatShare(share)} of the buildings the lateral system is not on record`;
}

/** What every building needs before it can be placed well. */
const NEEDED: ReadonlySet<string> = new Set([
  'storeys_above',
  'height_m',
  'floor_area_m2',
  'year_built',
  'system',
  'use',
  'occupants_peak',
  'occupied_hours_per_week',
  'site_class',
  'hazard_zone',
]);

/** Evidence that sharpens a place where it exists. */
const EVIDENCE: ReadonlySet<string> = new Set([
  'soft_storey',
  'torsion',
  'measured_period_longitudinal_s',
  'storey_stiffness_longitudinal_kN_per_m',
  'design_base_shear_coefficient',
  'capacity_sa_g',
]);

/** The attributes worth a bar, those that every building needs first; all when the inventory has none of them. */
export function decisiveAttributes({ attributes }: PageData['summary']): readonly AttributeCount[] {
  const known = attributes.filter((attribute) => attributeTotal(attribute) > attribute.unknown || attribute.attribute === 'system');
  const of = (names: ReadonlySet<string>): readonly AttributeCount[] => known.filter(({ attribute }) => names.has(attribute));
  const needed = of(NEEDED);
  return needed.length === 0 ? known : [...needed, ...of(EVIDENCE)];
}

/** True for what every building needs. */
export function isNeeded({ attribute }: AttributeCount): boolean {
  return NEEDED.has(attribute);
}

/** Buildings counted for an attribute. */
export function attributeTotal({ given, inferred, unknown, ...rest }: AttributeCount): number {
  return given + inferred + rest.default + unknown;
}

/** Share of the buildings whose value does not come from the inventory; 0 when there are none. */
export function shareNotGiven(attribute: AttributeCount): number {
  const total = attributeTotal(attribute);
  return total === 0 ? 0 : 1 - attribute.given / total;
}

/** The commonest reasons are named, the others counted together. */
const REASONS_NAMED = 3;

/** How many buildings are not ranked and why; empty when all are. */
export function notRankedSentence({ not_ranked }: PageData['summary']): string {
  const sum = (list: typeof not_ranked): number => list.reduce((total, { count }) => total + count, 0);
  if (not_ranked.length === 0) return '';
  const named = not_ranked.slice(0, REASONS_NAMED).map(({ reason, count }) => `${reason} (${formatCount(count)})`);
  const others = sum(not_ranked.slice(REASONS_NAMED));
  const rest = others === 0 ? '' : `; other reasons (${formatCount(others)})`;
  return `${counted(sum(not_ranked), 'building is', 'buildings are')} not ranked, by reason: ${named.join('; ')}${rest}.`;
}

/** How many cells of which columns were not read; empty when all were. */
export function unreadSentence({ findings }: Pick<PageData['summary'], 'findings'>): string {
  const counts = new Map<string, number>();
  for (const { column, count } of findings) if (column !== undefined) counts.set(column, (counts.get(column) ?? 0) + count);
  const told = [...counts].map(([column, count]) => `${findColumn(column)?.title ?? column} (${formatCount(count)})`).join('; ');
  return told === '' ? '' : `Cells that could not be read, by column: ${told}. What they say counts as unknown; each stands in rejects.csv.`;
}

/** What to write in the study when the heights look as if their unit were another; empty when they do not. */
export function heightUnitSentence({ findings }: Pick<PageData['summary'], 'findings'>): string {
  const unit = findings.some(({ code }) => code === 'column-looks-like-feet')
    ? (['feet', 'ft'] as const)
    : findings.some(({ code }) => code === 'column-looks-like-metres')
      ? (['metres', 'm'] as const)
      : null;
  if (unit === null) return '';
  return `The column of heights looks like ${unit[0]} and was not converted: if it is, write height_m: {column: …, unit: ${unit[1]}} under inventory.columns in study.yaml and screen again.`;
}

/** The slope of each spectrum and how it was come by; said once when all share it, empty when there is none. */
export function slopeSentence({ slopes }: Pick<PageData['summary'], 'slopes'>): string {
  const [first] = slopes;
  if (first === undefined) return '';
  const told = ({ k, how }: (typeof slopes)[number]): string => `${formatNumber(k, 3)} (${how})`;
  const words = slopes.every((slope) => told(slope) === told(first))
    ? told(first)
    : slopes.map((slope) => `${formatNumber(slope.k, 3)} for ${slope.spectrum} (${slope.how})`).join('; ');
  return `Slope k of the hazard curve: ${words}.`;
}

/** What "sure" and "wrong" mean, the edge of the list and the weak types, one sentence each. */
export function answerNotes({ summary }: PageData): readonly string[] {
  const { tie_group_at_edge: edge } = summary;
  const survey = summary.survey == null ? '' : outlookSentence(summary.survey);
  const before = [survey, heightUnitSentence(summary), notRankedSentence(summary), unreadSentence(summary)].filter((note) => note !== '');
  const notes = [
    ...before,
    `“Sure” is a chance of at least ${formatShare(SURE)} that the building truly belongs to the list; “wrong” is a place that better knowledge would give to another building.`,
  ];
  if (edge.to > edge.from && edge.from <= summary.list_size && edge.to > summary.list_size) {
    notes.push(`Ranks ${formatCount(edge.from)} to ${formatCount(edge.to)} lie across the edge of the list and cannot be told apart.`);
  }
  const weak = summary.weak_in_list + summary.weak_outside;
  if (weak > 0) {
    notes.push(
      `${counted(weak, 'ranked building is', 'ranked buildings are')} of a structural type known to be weak, for certain or as likely as not: ${formatCount(summary.weak_in_list)} in the list and ${formatCount(summary.weak_outside)} outside it.`,
    );
  }
  if (summary.largest_equal_block > 1) {
    notes.push(
      `The largest block of equal priorities holds ${formatCount(summary.largest_equal_block)} buildings: what is on record does not distinguish them.`,
    );
  }
  return notes;
}
