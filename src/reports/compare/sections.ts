/** The tables of a comparison: moves with their parts, data, settings. */
import { Fragment, h } from 'preact';
import type { ComponentChild } from 'preact';
import { CHANGE_PARTS } from '../../engineering/priority/compare.js';
import { formatCount } from '../../engineering/format.js';
import type { Comparison, ExplainedMove, OneSided } from '../../screening/compare-runs.js';
import type { DataTable } from '../dashboard/charts/chart.js';
import { Section, TableRegion } from '../dashboard/elements.js';
import { listWord, moveWord, rankWord, reasonWords, settingValue, signed } from './words.js';

interface Shown {
  readonly comparison: Comparison;
}

/** Buildings named where some came or went; the JSON has all. */
const NAMED = 200;

const labelOf = ({ id, name }: { readonly id: string; readonly name: string | null }): string =>
  name === null ? id : `${id} ${name}`;

/** Every explained building: ranks, parts of ln S, own and others' share of the move, reason. */
export function MovesSection({ comparison }: Shown): ComponentChild {
  const { buildings } = comparison;
  const kept = CHANGE_PARTS.filter(([part]) => buildings.some(({ parts }) => parts !== null && parts[part] !== 0));
  const cells = (move: ExplainedMove): readonly string[] => [
    labelOf(move),
    rankWord(move.rank_before),
    rankWord(move.rank),
    listWord(move),
    move.change === null ? '–' : signed(move.change),
    ...kept.map(([part]) => (move.parts === null ? '–' : signed(move.parts[part]))),
    ...(move.move === null
      ? ['–', '–', '–']
      : [move.move.own, move.move.others, move.move.came_and_left].map(moveWord)),
    reasonWords(move),
  ];
  const table: DataTable = {
    caption: 'The buildings of either list, then the largest other moves',
    head: [
      'Building',
      'Rank before',
      'Rank after',
      'List',
      'Change of ln S',
      ...kept.map(([, title]) => `of it ${title}`),
      'Rank: own change',
      'Rank: others’ changes',
      'Rank: came and left',
      'What changed',
    ],
    rows: buildings.map(cells),
  };
  return h(
    Section,
    { id: 'moves', title: 'Why they moved' },
    h(
      'p',
      { class: 'quiet' },
      'The parts add to the change of ln S, and the three moves to the whole move in rank. Own change: the place the building would have taken by its own new ln S, less the change common to all, among the others as they were.',
    ),
    kept.length === 0 ? null : h('p', { class: 'quiet narrow-only' }, 'The table is wider than this screen: it scrolls sideways.'),
    h(TableRegion, { table, label: table.caption }),
  );
}

function Sided({ title, rows }: { readonly title: string; readonly rows: readonly OneSided[] }): ComponentChild {
  if (rows.length === 0) return null;
  const more = rows.length - NAMED;
  const table: DataTable = {
    caption: more > 0 ? `${title}: the first ${formatCount(NAMED)} by rank of ${formatCount(rows.length)}` : title,
    head: ['Building', 'Rank'],
    rows: rows.slice(0, NAMED).map((row) => [labelOf(row), rankWord(row.rank)]),
  };
  return h('details', null, h('summary', null, `${title}: ${formatCount(rows.length)}`), h(TableRegion, { table, label: title }));
}

/** Buildings that came, went and changed, and how often each field did. */
export function DataSection({ comparison: { data, differs } }: Shown): ComponentChild {
  const fields: DataTable = {
    caption: 'Fields that differ, over the buildings in both inventories',
    head: ['Field', 'Buildings', 'of them given both times'],
    rows: data.fields.map(({ title, buildings, given_both }) => [title, formatCount(buildings), formatCount(given_both)]),
  };
  return h(
    Section,
    { id: 'data', title: 'What changed in the data' },
    differs.inventory || data.changed > 0
      ? h(
          Fragment,
          null,
          h(
            'p',
            null,
            `${formatCount(data.came.length)} buildings came, ${formatCount(data.went.length)} went; of the ${formatCount(data.in_both)} in both, ${formatCount(data.changed)} changed.`,
          ),
          data.fields.length === 0 ? null : h(TableRegion, { table: fields, label: fields.caption }),
          h(Sided, { title: 'Buildings that came', rows: data.came }),
          h(Sided, { title: 'Buildings that went', rows: data.went }),
        )
      : h('p', null, 'Both runs rank the same inventory.'),
  );
}

/** Settings by path, fingerprints. */
export function SettingsSection({ comparison }: Shown): ComponentChild {
  const { settings, before, after } = comparison;
  const table: DataTable = {
    caption: 'Settings kept with the runs that differ',
    head: ['Setting', 'Before', 'After'],
    rows: settings.map((change) => [change.path, settingValue(change.before), settingValue(change.after)]),
  };
  const prints: DataTable = {
    caption: 'Fingerprints',
    head: ['Of', 'Before', 'After'],
    rows: (['study', 'inventory', 'methods'] as const).map((of) => [
      of,
      before.fingerprints[of].slice(0, 16),
      after.fingerprints[of].slice(0, 16),
    ]),
  };
  return h(
    Section,
    { id: 'settings', title: 'What changed in the settings' },
    settings.length === 0 ? h('p', null, 'No setting differs.') : h(TableRegion, { table, label: table.caption }),
    h('h3', null, 'Fingerprints'),
    h(TableRegion, { table: prints, label: prints.caption }),
  );
}
