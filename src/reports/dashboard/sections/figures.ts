/** The sections that are mainly pictures. */
import { h } from 'preact';
import type { ComponentChild } from 'preact';
import type { PageData } from '../../../engineering/page-contract.js';
import type { Chart } from '../charts/chart.js';
import { NO_MAP } from '../charts/map.js';
import { slopeSentence } from '../answers.js';
import { Section } from '../elements.js';
import { ChartFigure } from './chart-figure.js';

const PICK = 'Point at a building for its name; choose it for its sheet.';

export function PeriodsSection({ data, spectrum, heights }: { data: PageData; spectrum: Chart; heights: Chart }): ComponentChild {
  const slope = slopeSentence(data.summary);
  const held = data.settings.holdPlateau
    ? 'Below the start of the plateau the ranking keeps the plateau’s value; the ramp to its left is drawn but not used.'
    : 'Below the start of the plateau the ranking follows the ramp, as the study asks.';
  return h(
    Section,
    { id: 'periods', title: 'Spectrum and periods' },
    h(ChartFigure, { chart: spectrum, hint: held }),
    slope === '' ? null : h('p', { class: 'quiet' }, slope),
    h(ChartFigure, { chart: heights, hint: PICK }),
    h('h3', null, 'Estimates side by side, by lateral system'),
    h(
      'p',
      { class: 'quiet' },
      'What every published formula and every stiffness route makes of the buildings of one system, and which of them counts. For one building they stand in its sheet.',
    ),
    h('div', { id: 'class-estimates' }),
  );
}

export function MapSection({ chart }: { readonly chart: Chart | null }): ComponentChild {
  return h(Section, { id: 'places', title: 'Map' }, chart === null ? h('p', null, NO_MAP) : h(ChartFigure, { chart, hint: PICK }));
}

export function OriginsSection({ chart }: { readonly chart: Chart }): ComponentChild {
  return h(
    Section,
    { id: 'origins', title: 'Where the numbers came from' },
    h(ChartFigure, {
      chart,
      hint: 'Given: in the inventory. Inferred: by a rule from other values of the building or its neighbours, with a wider spread. Default: a value of the study. Unknown: left open, every possibility counted by its chance.',
    }),
  );
}
