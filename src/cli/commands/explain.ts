import { formatCount, formatPlaces, formatShare } from '../../engineering/format.js';
import { EXIT } from '../../errors.js';
import { explain as explainInStudy } from '../../runs/open.js';
import type { Explanation } from '../../screening/explain.js';
import { memberPlace, titleOf } from '../../reports/sites/words.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { stepLines } from '../output/steps.js';
import { styled } from '../output/style.js';
import { clean, wrap } from '../output/text.js';

interface Options {
  readonly study?: string;
  readonly run?: number;
  readonly units: 'si' | 'us';
  readonly json?: true;
}

/** `swaymark explain`: the hand calculation of one building. */
export async function explain(id: string, options: Options): Promise<number> {
  const explanation = await explainInStudy(findStudy(options.study), id, { run: options.run, units: options.units });
  if (options.json) printJson(asJson(explanation));
  else printLines(lines(explanation, Math.min(terminalColumns(), 100)));
  return EXIT.clean;
}

function asJson({ runId, building, name, group, site, stored, steps }: Explanation): unknown {
  return { run: runId, id: building.id, name, group, site, inputs: building, results: stored, steps };
}

function lines({ runId, building, name, group, site, stored, steps }: Explanation, columns: number): string[] {
  const title = [building.id, name, group === null ? null : `(${group})`].filter((part) => part !== null).join(' ');
  return [
    ...wrap(clean(title), columns).map((line) => styled('bold', line)),
    ...wrap(clean(placeSentence(runId, stored)), columns),
    ...(site === null ? [] : wrap(clean(siteSentence(site, building.id)), columns)),
    '',
    ...stepLines(steps, columns),
  ];
}

function placeSentence(runId: number, stored: Explanation['stored']): string {
  const count = (name: string): string => formatCount(Number(stored[name]));
  const reason = stored['not_ranked'];
  if (typeof reason === 'string') return `Not ranked in run ${String(runId)}: ${reason}.`;
  const inList = stored['in_list'] === 'yes' ? 'in the list' : 'outside the list';
  return `Rank ${count('rank')} in run ${String(runId)}, ${inList}; chance of belonging ${formatShare(Number(stored['chance']))}; rank band ${count('rank_best')} to ${count('rank_worst')}; tie group ${count('tie_group')}; rank by spectral demand alone ${formatPlaces(Number(stored['demand_rank']), Number(stored['demand_rank_last'] ?? NaN))}.`;
}

/** Members named in the terminal; `--json` has all. */
const MEMBERS_SHOWN = 8;

function siteSentence(site: NonNullable<Explanation['site']>, own: string): string {
  const others = site.members.filter(({ id }) => id !== own).slice(0, MEMBERS_SHOWN);
  const left = site.buildings - 1 - others.length;
  const chance =
    site.chance === null
      ? ''
      : ` Chance that at least one of them belongs to the list ${formatShare(site.chance)}, what is not known of each taken as independent.`;
  return `Site of ${titleOf(site)}, ${formatCount(site.buildings)} buildings: with ${others.map((member) => `${titleOf(member)} (${memberPlace(member)})`).join('; ')}${left > 0 ? ` and ${formatCount(left)} more` : ''}.${chance}`;
}
