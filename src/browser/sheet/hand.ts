/** The hand calculation, made here by the code that ranked: the value it yields is held against the stored one. */
import { assess, isRanked } from '../../engineering/assess/assess.js';
import { compileContext } from '../../engineering/assess/context.js';
import type { AssessContext } from '../../engineering/assess/context.js';
import { buildingAt } from '../../engineering/building-columns.js';
import { gridsOf } from '../../engineering/spectrum/grid-carry.js';
import { handSteps } from '../../engineering/hand.js';
import type { HandStep } from '../../engineering/hand.js';
import { Trace } from '../../engineering/trace.js';
import { el } from '../dom.js';
import type { Portfolio } from '../portfolio.js';

/**
 * Browsers do not share the program's exponential and logarithm: Chromium 156 and Node 20 differ in the last bit of a tenth of the
 * exponentials (measured), which moves ln S by a few units in the sixteenth digit.
 */
/** A maker of hand calculations; the study's settings are compiled once. */
export function handMaker(p: Portfolio): (i: number) => readonly HTMLElement[] {
  let context: AssessContext | null = null;
  return (i) => {
    context ??= compileContext(p.page.settings, gridsOf(p.page.grids));
    const { inputs, pools, found } = p.page.buildings;
    const trace = new Trace(found[inputs.id[i] ?? '']);
    const result = assess(buildingAt(inputs, i, pools), context, trace);
    const steps = handSteps(trace, p.page.display);
    const list = el('ol', { class: 'hand' }, ...steps.map(stepItem));
    return [agreement(isRanked(result) ? result.lnPriority : NaN, p.number('ln_priority', i)), list];
  };
}

function agreement(made: number, stored: number): HTMLElement {
  if (Number.isNaN(made) && Number.isNaN(stored))
    return el('p', { class: 'agrees' }, 'This building is not ranked, so there is no priority to work out.');
  const verdict =
    made === stored
      ? 'The two are identical.'
      : 'The two differ: do not use this page until the difference is explained.';
  return el(
    'p',
    { class: 'agrees', 'data-agrees': made === stored ? 'exactly' : 'no' },
    `Worked out now: ln S = ${String(made)}. Stored by the run: ln S = ${String(stored)}. ${verdict}`,
  );
}

function stepItem(step: HandStep): HTMLLIElement {
  const from = [step.source, step.mark].filter((text) => text !== '').join(' · ');
  const source = from === '' ? null : el('div', { class: 'from' }, from);
  const details = step.details.map((text) => el('div', { class: 'from' }, text));
  switch (step.kind) {
    case 'heading':
      return el('li', { class: 'heading' }, step.title);
    case 'value':
      return el(
        'li',
        {},
        `${valueName(step.title)}: `,
        el('span', { class: 'result' }, step.result),
        source,
        ...details,
      );
    case 'choice':
      return el('li', {}, `${step.title}: `, el('span', { class: 'result' }, step.symbolic), source, ...details);
    case 'formula':
      return el(
        'li',
        {},
        step.title,
        el('div', { class: 'maths' }, step.symbolic),
        el('div', { class: 'maths' }, step.substituted),
        el('div', { class: 'maths result' }, step.result),
        source,
        ...details,
      );
  }
}

/** "height_m" -> "height"; the unit stands with the value. */
function valueName(name: string): string {
  return name.replace(/_(?:kN_per_m2|kN_per_m|m2|kN|mps|m|s|g)$/, '').replaceAll('_', ' ');
}
