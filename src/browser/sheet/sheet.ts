/** The building sheet: a dialog opened from table, list, map or address. */
import { addressed, sheetAddress } from '../address.js';
import { byId, el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';
import { flagSentences, weakWords } from '../words.js';
import { formatShare } from '../../engineering/format.js';
import type { Fact } from './facts.js';
import { inputFacts, placeSentences, resultFacts } from './facts.js';
import { estimatesMaker } from '../estimates/building.js';
import { handMaker } from './hand.js';
import { neighbourParts } from './neighbours.js';
import { siteParts } from './site.js';

/** Wires the dialog and returns the function that opens the sheet of building `i`. */
export function startSheet(p: Portfolio): (i: number) => void {
  const dialog = byId('sheet') as HTMLDialogElement;
  const handOf = handMaker(p);
  const estimatesOf = estimatesMaker(p);
  let shown: string | null = null;

  const show = (i: number): void => {
    shown = p.id(i);
    dialog.replaceChildren(
      sheetOf(p, i, { hand: handOf, estimates: estimatesOf }, () => {
        dialog.close();
      }),
    );
    if (!dialog.open) dialog.showModal();
    dialog.scrollTop = 0;
  };
  const follow = (): void => {
    const id = addressed(location.hash);
    if (id === null) {
      if (dialog.open) dialog.close();
      return;
    }
    const i = p.placeOf(id);
    if (i !== undefined && !(dialog.open && shown === id)) show(i);
  };
  dialog.addEventListener('close', () => {
    shown = null;
    if (addressed(location.hash) !== null) history.replaceState(null, '', '#');
  });
  // A click on the dialog itself, not on what is in it, is a click beside the sheet.
  dialog.addEventListener('click', (event) => {
    if (event.target === dialog) dialog.close();
  });
  addEventListener('hashchange', follow);
  follow();
  return (i) => {
    location.hash = sheetAddress(p.id(i));
  };
}

type Maker = (i: number) => readonly HTMLElement[];

/** A button that gives way to what it makes, which takes the focus. */
function onDemand(id: string, title: string, make: () => readonly HTMLElement[]): readonly HTMLElement[] {
  const made = el('div', { id });
  const button = el('button', { type: 'button', class: 'plain screen-only', id: `make-${id}` }, title);
  button.addEventListener('click', () => {
    made.replaceChildren(...make());
    button.hidden = true;
    made.tabIndex = -1;
    made.focus();
  });
  return [button, made];
}

function facts(list: readonly Fact[]): HTMLElement {
  return el('dl', { class: 'facts' }, ...list.flatMap(([name, value]) => [el('dt', {}, name), el('dd', {}, value)]));
}

function sheetOf(
  p: Portfolio,
  i: number,
  makers: { readonly hand: Maker; readonly estimates: Maker },
  close: () => void,
): HTMLElement {
  const ranked = p.text('not_ranked', i) === '';
  const button = el('button', { type: 'button', class: 'plain screen-only', autofocus: '' }, 'Close');
  button.addEventListener('click', close);
  const warnings = [
    ...(p.text('weak_type', i) === ''
      ? []
      : [
          `Weak structural type: ${weakWords(p.text('weak_type', i))} (chance ${formatShare(p.number('weak_chance', i))}).`,
        ]),
    ...(p.page.buildings.heritage[i] === 'yes' ? ['Protected as heritage.'] : []),
    ...flagSentences(p.text('flags', i)),
  ];
  const hand = onDemand('hand', 'Work it out by hand', () => makers.hand(i));
  const estimates = onDemand('estimates', 'Put all estimates side by side', () => makers.estimates(i));
  const partOf = p.page.buildings.part_of[i] ?? '';
  const identity: Fact[] = [
    ['Identifier', p.id(i)],
    ...(p.group(i) === '' ? [] : [['Block or zone', p.group(i)] as const]),
    ...(partOf === '' ? [] : [['Part of', partOf] as const]),
    ['Row of the inventory', String(p.page.buildings.first_row[i] ?? '')],
  ];
  return el(
    'div',
    { class: 'sheet' },
    el('div', { class: 'sheet-head' }, el('h2', { id: 'sheet-title' }, p.label(i)), button),
    facts(identity),
    el('h3', {}, 'Place in the ranking'),
    ...placeSentences(p, i).map((sentence) => el('p', {}, sentence)),
    ...siteParts(p, i),
    ...(warnings.length === 0
      ? []
      : [el('h3', {}, 'What to know'), el('ul', { class: 'plain' }, ...warnings.map((text) => el('li', {}, text)))]),
    ...(ranked ? [el('h3', {}, 'Period, demand, capacity'), facts(resultFacts(p, i))] : []),
    ...neighbourParts(p, i),
    el('h3', {}, 'What it rests on'),
    facts(inputFacts(p, i)),
    el('h3', {}, 'Estimates of the period'),
    ...estimates,
    el('h3', {}, 'Hand calculation'),
    el(
      'p',
      { class: 'quiet' },
      'The most likely case step by step, made in this page from the values above by the same code that made the ranking.',
    ),
    ...hand,
    el(
      'p',
      { class: 'quiet' },
      'Desk screening; Swaymark itself visited nothing and read no drawings. It is an order for further assessment, not a statement about the safety of this building.',
    ),
  );
}
