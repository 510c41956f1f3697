/** Every estimate of one building's period, side by side: made in the page by the code that ranked. */
import { compileContext } from '../../engineering/assess/context.js';
import type { AssessContext } from '../../engineering/assess/context.js';
import { periodEstimates } from '../../engineering/assess/estimates.js';
import { shownSystem } from '../../engineering/assess/shown-system.js';
import type { AppliedEstimate, Estimate } from '../../engineering/assess/estimate.js';
import { buildingAt } from '../../engineering/building-columns.js';
import { formatNumber, formatShare, plainWords } from '../../engineering/format.js';
import { el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';
import { bar, scaleOf } from './bars.js';

/** What part an estimate plays, in words. */
export function partWords({ kind }: Pick<Estimate, 'kind'>, counts: boolean): string {
  if (kind === 'used') return 'used';
  if (counts) return 'counts';
  if (kind === 'other standard') return 'other standard';
  return kind === 'regression' ? 'research' : 'check';
}

/** A maker of the side-by-side view of building `i`; the study's settings are compiled once. */
export function estimatesMaker(p: Portfolio): (i: number) => readonly HTMLElement[] {
  let context: AssessContext | null = null;
  return (i) => {
    context ??= compileContext(p.page.settings);
    const building = buildingAt(p.page.buildings.inputs, i, p.page.buildings.pools);
    const shown = shownSystem(building, context);
    if (typeof shown === 'string') return [el('p', {}, `No period can be estimated: ${shown}.`)];
    const along = periodEstimates(building, 'longitudinal', shown.along, context);
    const across = periodEstimates(building, 'transverse', shown.across, context);
    const alike = JSON.stringify(along) === JSON.stringify(across);
    const system =
      shown.along === shown.across
        ? plainWords(shown.along)
        : `${plainWords(shown.along)} along and ${plainWords(shown.across)} across`;
    const sentence = shown.onRecord
      ? `Lateral system ${system}, given.`
      : `The lateral system is not on record; shown for the likeliest, ${system} (chance ${formatShare(shown.chance)}).`;
    return [
      el(
        'p',
        { class: 'quiet' },
        `${sentence} The bar is the range of each estimate on a logarithmic scale, the mark its value.`,
      ),
      ...(alike
        ? [tableOf('Both directions alike', along)]
        : [tableOf('Longitudinal direction', along), tableOf('Transverse direction', across)]),
    ];
  };
}

function tableOf(caption: string, estimates: readonly Estimate[]): HTMLElement {
  const applied = estimates.flatMap((each) => (each.outcome.applies ? [{ each, outcome: each.outcome }] : []));
  const scale = scaleOf(applied.flatMap(({ outcome }) => [outcome.low_s, outcome.high_s]));
  const row = ({ each, outcome }: { each: Estimate; outcome: AppliedEstimate }): HTMLElement =>
    el(
      'tr',
      outcome.counts ? { class: 'listed' } : {},
      el('th', { scope: 'row' }, each.title, el('div', { class: 'from' }, each.source)),
      el('td', { class: 'num' }, formatNumber(outcome.period_s, 3)),
      el(
        'td',
        {},
        `${formatNumber(outcome.low_s, 3)} to ${formatNumber(outcome.high_s, 3)}`,
        bar(scale, outcome.low_s, outcome.period_s, outcome.high_s, outcome.counts),
      ),
      el('td', {}, partWords(each, outcome.counts)),
      el('td', {}, [outcome.why, ...outcome.notes].join('; ')),
    );
  const unusable = estimates.flatMap(({ title, source, outcome }) =>
    outcome.applies ? [] : [el('li', {}, `${title}${source === '' ? '' : `, ${source}`}: ${outcome.reason}.`)],
  );
  return el(
    'div',
    {},
    el(
      'div',
      {
        class: 'scroll',
        role: 'region',
        tabindex: '0',
        'aria-label': `Estimates of the period, ${caption.toLowerCase()}`,
      },
      el(
        'table',
        { class: 'estimates' },
        el('caption', {}, caption),
        el(
          'thead',
          {},
          el(
            'tr',
            {},
            ...['Estimate', 'T (s)', 'Range (s)', 'Part', 'Why'].map((text, c) =>
              el('th', { scope: 'col', ...(c === 1 ? { class: 'num' } : {}) }, text),
            ),
          ),
        ),
        el('tbody', {}, ...applied.map(row)),
      ),
    ),
    unusable.length === 0
      ? null
      : el(
          'details',
          {},
          el('summary', {}, `${String(unusable.length)} more do not apply here, and why`),
          el('ul', { class: 'plain' }, ...unusable),
        ),
  );
}
