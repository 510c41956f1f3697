/** The estimates of all buildings of one lateral system on record: what each formula makes of the class. */
import { ClassEstimates } from '../../engineering/assess/class-estimates.js';
import type { ClassEstimate } from '../../engineering/assess/class-estimates.js';
import { compileContext } from '../../engineering/assess/context.js';
import type { AssessContext } from '../../engineering/assess/context.js';
import { periodEstimates } from '../../engineering/assess/estimates.js';
import { buildingReader } from '../../engineering/building-columns.js';
import { SYSTEMS } from '../../engineering/building.js';
import type { System } from '../../engineering/building.js';
import { DIRECTIONS } from '../../engineering/direction.js';
import { formatCount, formatNumber, plainWords } from '../../engineering/format.js';
import { byId, el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';
import { bar, scaleOf } from './bars.js';

/** Fills the part of the page that compares estimates class by class; worked out when a class is chosen. */
export function startClasses(p: Portfolio): void {
  const counts = new Map<System, number[]>();
  for (let i = 0; i < p.count; i += 1) {
    const system = SYSTEMS.find((each) => each === p.word('system', i));
    if (system === undefined || p.text('not_ranked', i) !== '') continue;
    counts.set(system, [...(counts.get(system) ?? []), i]);
  }
  const place = byId('class-estimates');
  if (counts.size === 0) {
    place.append(el('p', {}, 'No building has its lateral system on record.'));
    return;
  }
  const systems = [...counts].sort(([, a], [, b]) => b.length - a.length);
  const select = el(
    'select',
    { id: 'class-system' },
    el('option', { value: '' }, 'Choose a lateral system'),
    ...systems.map(([system, members]) =>
      el('option', { value: system }, `${plainWords(system)} (${formatCount(members.length)})`),
    ),
  );
  const shown = el('div', { 'aria-live': 'polite' });
  let context: AssessContext | null = null;
  select.addEventListener('change', () => {
    const system = SYSTEMS.find((each) => each === select.value);
    if (system === undefined) {
      shown.replaceChildren();
      return;
    }
    context ??= compileContext(p.page.settings);
    shown.replaceChildren(classTable(p, context, system, counts.get(system) ?? []));
  });
  place.append(
    el(
      'div',
      { class: 'tools screen-only' },
      el('label', {}, 'Buildings whose lateral system is on record as', select),
    ),
    shown,
  );
}

function classTable(p: Portfolio, context: AssessContext, system: System, members: readonly number[]): HTMLElement {
  const read = buildingReader(p.page.buildings.inputs, p.page.buildings.pools);
  const gathered = new ClassEstimates();
  for (const i of members) {
    const building = read(i);
    for (const direction of DIRECTIONS) {
      // another system across a building is another class
      if (direction === 'transverse' && (building.system_transverse ?? system) !== system) continue;
      gathered.add(periodEstimates(building, direction, system, context));
    }
  }
  const estimates = gathered.summary();
  const applied = estimates.filter(({ applies }) => applies > 0);
  const scale = scaleOf(applied.flatMap(({ p10_s, p90_s }) => [p10_s, p90_s]));
  const heads = [
    'Estimate',
    'Applies',
    'Counts',
    'Median T (s)',
    '10 to 90 % (s)',
    'Over the period used',
    'Commonest reason',
  ];
  const number = (text: string): HTMLElement => el('td', { class: 'num' }, text);
  const row = (each: ClassEstimate): HTMLElement =>
    el(
      'tr',
      each.counts > 0 ? { class: 'listed' } : {},
      el('th', { scope: 'row' }, each.title, el('div', { class: 'from' }, each.source)),
      number(formatCount(each.applies)),
      number(each.kind === 'used' ? '' : formatCount(each.counts)),
      number(formatNumber(each.median_s, 3)),
      el(
        'td',
        {},
        `${formatNumber(each.p10_s, 3)} to ${formatNumber(each.p90_s, 3)}`,
        bar(scale, each.p10_s, each.median_s, each.p90_s, each.counts > 0),
      ),
      number(each.kind === 'used' ? '' : formatNumber(each.over_used, 3)),
      el('td', {}, each.why),
    );
  const label = `Estimates of the period, ${plainWords(system)}: ${formatCount(members.length)} ${members.length === 1 ? 'building' : 'buildings'}, each direction of that system`;
  return el(
    'div',
    { class: 'scroll long', role: 'region', tabindex: '0', 'aria-label': label },
    el(
      'table',
      { class: 'estimates' },
      el('caption', {}, label),
      el(
        'thead',
        {},
        el(
          'tr',
          {},
          ...heads.map((text, c) =>
            el('th', { scope: 'col', ...([1, 2, 3, 5].includes(c) ? { class: 'num' } : {}) }, text),
          ),
        ),
      ),
      el('tbody', {}, ...applied.map(row)),
    ),
  );
}
