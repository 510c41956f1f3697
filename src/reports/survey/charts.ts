/** What the survey does to the list, and where its visits are. */
import { formatNumber } from '../../engineering/format.js';
import type { SurveyPlan } from '../../screening/survey.js';
import { columnsOf, rendererFor } from '../dashboard/charts/chart.js';
import type { Chart } from '../dashboard/charts/chart.js';
import { groundPlan } from '../dashboard/charts/ground-plan.js';
import { askedWords } from './words.js';

/** Expected wrong places of the list over the cost of the visits. */
export function gainChart(plan: SurveyPlan): Chart {
  const { steps, cost, expected_wrong_before, expected_wrong_after } = plan;
  const unit = cost !== 'money' ? 'h' : 'money';
  const rows = [
    { spent: 0, wrong: expected_wrong_before },
    ...steps.map((step) => ({
      spent: cost !== 'money' ? step.hours_so_far : step.money_so_far,
      wrong: step.expected_wrong_places,
    })),
  ];
  return {
    id: 'gain',
    title: 'What the visits do to the list',
    sentence: `From about ${formatNumber(expected_wrong_before, 2)} to about ${formatNumber(expected_wrong_after, 2)} places expected to be wrong, over ${formatNumber(rows.at(-1)?.spent ?? 0, 3)} ${unit} of visits in the order of the plan.`,
    table: {
      caption: 'Expected wrong places after each visit',
      head: ['Visit', cost !== 'money' ? 'Hours so far' : 'Money so far', 'Expected wrong places'],
      rows: rows.map(({ spent, wrong }, i) => [String(i), formatNumber(spent, 3), formatNumber(wrong, 3)]),
    },
    data: { gain: columnsOf(rows) },
    renderer: rendererFor(rows.length),
    spec: {
      width: 'container',
      height: 220,
      data: { name: 'gain' },
      layer: [
        { mark: { type: 'line', interpolate: 'step-after', strokeWidth: 2, color: 'var(--accent)' } },
        { mark: { type: 'point', filled: true, size: 24, color: 'var(--accent)' } },
      ],
      encoding: {
        x: {
          field: 'spent',
          type: 'quantitative',
          title: cost !== 'money' ? 'Hours of visits' : 'Money for visits',
        },
        y: {
          field: 'wrong',
          type: 'quantitative',
          title: 'Places expected to be wrong',
          scale: { domainMin: 0 },
        },
      },
    },
  };
}

/** Where the visits are, numbered in the order of the plan; null without coordinates. */
export function visitsMap({ steps }: SurveyPlan): Chart | null {
  const seen = new Set<string>();
  const stops = steps.flatMap((step) => {
    const { id, lon, lat } = step;
    if (seen.has(id) || lon === null || lat === null) return [];
    seen.add(id);
    return [{ step, lon, lat }];
  });
  if (stops.length === 0) return null;
  const plan = groundPlan(stops);
  const rows = stops.map(({ step }, i) => ({
    place: String(step.place),
    id: step.id,
    visit: step.visit,
    east: plan[i]?.east_m ?? NaN,
    north: plan[i]?.north_m ?? NaN,
  }));
  const reach = Math.max(25, ...rows.flatMap(({ east, north }) => [Math.abs(east), 2 * Math.abs(north)])) * 1.1;
  // one scale both ways
  const per = `(${String(reach)} / (width / 2))`;
  return {
    id: 'visits',
    title: 'Where the visits are',
    sentence: `${String(stops.length)} buildings, numbered by their first visit in the plan; one scale both ways, north up.`,
    table: {
      caption: 'Buildings to visit',
      head: ['First visit', 'Building', 'Kind', 'Find out', 'East (m)', 'North (m)'],
      rows: stops.map(({ step }, i) => [
        String(step.place),
        step.name === null ? step.id : `${step.id} ${step.name}`,
        step.visit,
        askedWords(step),
        ...rows.slice(i, i + 1).flatMap(({ east, north }) => [formatNumber(east, 3), formatNumber(north, 3)]),
      ]),
    },
    data: { visits: columnsOf(rows) },
    renderer: rendererFor(rows.length),
    spec: {
      width: 'container',
      height: 360,
      data: { name: 'visits' },
      layer: [
        { mark: { type: 'point', filled: true, size: 60, color: 'var(--accent)' } },
        { mark: { type: 'text', dx: 11, dy: -9, fontSize: 11.5, fontWeight: 600 }, encoding: { text: { field: 'place', type: 'nominal' } } },
      ],
      encoding: {
        x: {
          field: 'east',
          type: 'quantitative',
          title: 'East of the middle (m)',
          scale: { zero: false, nice: false, domainMin: { expr: `-width / 2 * ${per}` }, domainMax: { expr: `width / 2 * ${per}` } },
        },
        y: {
          field: 'north',
          type: 'quantitative',
          title: 'North of the middle (m)',
          scale: { zero: false, nice: false, domainMin: { expr: `-height / 2 * ${per}` }, domainMax: { expr: `height / 2 * ${per}` } },
        },
      },
    },
  };
}
