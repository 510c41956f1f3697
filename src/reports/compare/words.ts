/** A comparison in words, for terminal and page alike. */
import { CHANGE_PARTS } from '../../engineering/priority/compare.js';
import { formatCount, formatNumber } from '../../engineering/format.js';
import type { InputChange } from '../../screening/compare-inputs.js';
import type { Comparison, ExplainedMove } from '../../screening/compare-runs.js';
import { showValue } from '../../errors.js';

/** "run 3", with its title or the file of its inventory where those tell the two apart. */
export function runNames({ before, after }: Comparison): readonly [string, string] {
  const told = (run: Comparison['before']): string => {
    const name = `run ${String(run.run)}`;
    if (before.title !== after.title) return `${name} of “${cut(run.title)}”`;
    return before.file === after.file ? name : `${name} (${cut(run.file)})`;
  };
  return [told(before), told(after)];
}

const LONGEST_TITLE = 50;

function cut(title: string): string {
  const points = [...title];
  return points.length <= LONGEST_TITLE ? title : `${points.slice(0, LONGEST_TITLE - 1).join('').trimEnd()}…`;
}

/** What became of the list, in one sentence. */
export function listSentence({ list }: Comparison): string {
  const { overlap, places, places_before, entered, left } = list;
  if (entered.length === 0 && left.length === 0) return `The list holds the same ${count(overlap, 'building')} as before.`;
  const lists = places === places_before ? `${formatCount(places)} places` : `${formatCount(places)} places (${formatCount(places_before)} before)`;
  return `Of the ${lists} of the list ${formatCount(overlap)} are held by buildings that held one before; ${formatCount(entered.length)} entered, ${formatCount(left.length)} left.`;
}

/** How alike the two orders are, and what all buildings share. */
export function orderSentences({ ranked_both, moved, tau_b, common_change }: Comparison): readonly string[] {
  if (ranked_both === 0) return ['No building is ranked in both runs.'];
  const still = moved === 0 ? 'none of them stands at another rank' : `${formatCount(moved)} of them stand at another rank`;
  const tau = tau_b === null ? '' : `; Kendall's tau-b of their priorities is ${formatTau(tau_b)} (1: the same order)`;
  const sentences = [`${count(ranked_both, 'building')} ranked in both runs: ${still}${tau}.`];
  if (common_change !== null && Math.abs(common_change) > 1e-9)
    sentences.push(`ln S of the median building changed by ${signed(common_change)}. That moves nobody: a building's own change in rank is what its ln S changed by beyond it.`);
  return sentences;
}

/** Cut, so that only the same order prints as 1. */
function formatTau(tau: number): string {
  return (Math.trunc(tau * 10_000) / 10_000).toFixed(4).replace('-', '−');
}

/** Which of inventory, settings and methods differ. */
export function differenceSentences({ differs, settings, data, before, after }: Comparison): readonly string[] {
  return [
    differs.inventory
      ? `Inventory: ${count(data.came.length, 'building')} came, ${formatCount(data.went.length)} went, ${formatCount(data.in_both)} are in both, of which ${formatCount(data.changed)} changed.`
      : 'Inventory: the same.',
    settings.length === 0 ? 'Settings: the same.' : `Settings: ${count(settings.length, 'change')}.`,
    differs.methods
      ? `Methods: the register of methods differs (${before.fingerprints.methods.slice(0, 12)} and ${after.fingerprints.methods.slice(0, 12)}).`
      : 'Methods: the same.',
    ...(differs.program ? [`Program: ${before.program}, then ${after.program}.`] : []),
  ];
}

function count(value: number, one: string): string {
  return `${formatCount(value)} ${one}${value === 1 ? '' : 's'}`;
}

/** A change with its sign, to a thousandth: "+0.312", "−0.050", "0". */
export function signed(value: number): string {
  // a sum's last bits are no change
  if (Math.abs(value) < 1e-12) return '0';
  if (Math.abs(value) < 0.0005) return value > 0 ? '+0.000' : '−0.000';
  return `${value > 0 ? '+' : '−'}${Math.abs(value).toFixed(3)}`;
}

/** Ranks gained or lost: "up 3", "down 12", "no move". */
export function moveWord(places: number): string {
  return places === 0 ? 'no move' : `${places < 0 ? 'up' : 'down'} ${formatCount(Math.abs(places))}`;
}

export function rankWord(rank: number | null): string {
  return rank === null ? '–' : formatCount(rank);
}

/** What became of a building's place on the list. */
export function listWord({ listed_before, listed, came, went }: ExplainedMove): string {
  if (listed && listed_before) return 'stays';
  if (listed) return came ? 'enters, new' : 'enters';
  if (listed_before) return went ? 'leaves, gone' : 'leaves';
  return 'outside';
}

/** The parts of its change of ln S, largest first, those under 0.0005 left out. */
export function partsWords({ parts, change }: ExplainedMove): string {
  if (parts === null || change === null) return '';
  const told = CHANGE_PARTS.filter(([name]) => Math.abs(parts[name]) >= 0.0005)
    .sort(([a], [b]) => Math.abs(parts[b]) - Math.abs(parts[a]))
    .map(([name, title]) => `${title} ${signed(parts[name])}`);
  return told.length === 0 ? 'ln S as before' : `ln S ${signed(change)}: ${told.join(', ')}`;
}

/** Own change against others': "own change up 3, others down 1, came and left up 2". */
export function moveWords({ move }: ExplainedMove): string {
  if (move === null) return '';
  const { own, others, came_and_left } = move;
  const parts = [`own change ${moveWord(own)}`, `others ${moveWord(others)}`];
  if (came_and_left !== 0) parts.push(`buildings that came and left ${moveWord(came_and_left)}`);
  return parts.join(', ');
}

/** What the leading case read, where it differs: demand, capacity, period, system, code. */
export function leadingWords({ before, after }: ExplainedMove): string {
  if (before === null || after === null) return '';
  const told: string[] = [];
  const number = (title: string, a: number, b: number, unit: string): void => {
    if (Object.is(a, b) || Math.abs(a - b) < 1e-9 * Math.abs(a)) return;
    const [one, two] = [formatNumber(a), formatNumber(b)];
    told.push(`${title} ${one === two ? formatNumber(a, 6) : one} → ${one === two ? formatNumber(b, 6) : two}${unit}`);
  };
  number('S_a', before.sa_g, after.sa_g, ' g');
  number('C', before.capacity_g, after.capacity_g, ' g');
  number('T', before.period_s, after.period_s, ' s');
  number('E', before.people_exposed, after.people_exposed, '');
  number('I', before.importance_factor, after.importance_factor, '');
  number('k', before.slope_k, after.slope_k, '');
  if (before.spectrum !== after.spectrum) told.push(`spectrum ${before.spectrum ?? '–'} → ${after.spectrum ?? '–'}`);
  if (before.system !== after.system) told.push(`system ${before.system ?? '–'} → ${after.system ?? '–'}`);
  if (before.edition !== after.edition) told.push(`code ${before.edition ?? '–'} → ${after.edition ?? '–'}`);
  return told.join(', ');
}

/** "Storeys above ground 3 (given) → 5 (inferred)". */
export function inputWords({ title, before, origin_before, after, origin }: InputChange): string {
  const value = (x: InputChange['before'], from: string | null): string => {
    const text = typeof x === 'number' ? plainNumber(x) : (x ?? 'blank');
    return from === null || (x === null && from === 'unknown') ? text : `${text} (${from})`;
  };
  return `${title} ${value(before, origin_before)} → ${value(after, origin)}`;
}

/** To five digits, without zeros that say nothing. */
function plainNumber(value: number): string {
  const text = formatNumber(value, 5);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

/** Why, in one line: what of its record changed, its reason not to be ranked, or what the leading case read. */
export function reasonWords(move: ExplainedMove): string {
  if (move.came) return 'only in the later inventory';
  if (move.went) return 'only in the earlier inventory';
  const inputs = move.inputs.map(inputWords);
  const notRanked = move.not_ranked === null ? [] : [`not ranked: ${move.not_ranked}`];
  const leading = leadingWords(move);
  return [...notRanked, ...inputs, ...(leading === '' ? [] : [leading])].join('; ');
}

export function settingValue(value: unknown): string {
  return value === null ? 'not there' : typeof value === 'string' ? value : showValue(value);
}
