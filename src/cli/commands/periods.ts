import type { ClassEstimate } from '../../engineering/assess/class-estimates.js';
import type { AppliedEstimate, Estimate, EstimateKind } from '../../engineering/assess/estimate.js';
import { SYSTEMS } from '../../engineering/building.js';
import type { System } from '../../engineering/building.js';
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import { EXIT, UserError, showValue } from '../../errors.js';
import { periods as periodsOfBuilding, periodsOfClass } from '../../runs/open.js';
import type { PeriodClass, PeriodSheet } from '../../screening/period-sheet.js';
import { findStudy } from '../find-study.js';
import { printJson, printLines, terminalColumns } from '../output/print.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

interface Options {
  readonly study?: string;
  readonly run?: number;
  readonly system?: string;
  readonly block?: string;
  readonly json?: true;
}

/** `swaymark periods`: every estimate of one building's period, or of a class of buildings. */
export async function periods(id: string | undefined, options: Options): Promise<number> {
  const study = findStudy(options.study);
  const system = systemCalled(options.system);
  const columns = Math.min(terminalColumns(), 120);
  if (id === undefined) {
    if (system === undefined)
      throw new UserError(
        'name a building, or a class of buildings with --system; `swaymark periods --help` shows both',
      );
    const found = await periodsOfClass(study, system, {
      run: options.run,
      ...(options.block === undefined ? {} : { group: options.block }),
    });
    if (options.json) printJson(classJson(found));
    else printLines(classLines(found, columns));
    return EXIT.clean;
  }
  if (options.block !== undefined) throw new UserError('--block goes with a class (--system), not with one building');
  const sheet = await periodsOfBuilding(study, id, {
    run: options.run,
    ...(system === undefined ? {} : { system }),
  });
  if (options.json) printJson(asJson(sheet));
  else printLines(sheetLines(sheet, columns));
  return EXIT.clean;
}

function systemCalled(name: string | undefined): System | undefined {
  if (name === undefined) return undefined;
  const found = SYSTEMS.find((system) => system === name);
  if (found === undefined) throw new UserError(`unknown system ${showValue(name)}; known: ${SYSTEMS.join(', ')}`);
  return found;
}

function asJson({ runId, building, name, system, systemTransverse, ...rest }: PeriodSheet): unknown {
  const { systemFrom, chance, directions } = rest;
  return {
    run: runId,
    id: building.id,
    name,
    system,
    system_transverse: systemTransverse,
    system_from: systemFrom,
    chance,
    directions,
  };
}

function classJson({ runId, ...rest }: PeriodClass): unknown {
  return { run: runId, ...rest };
}

function sheetLines(sheet: PeriodSheet, columns: number): string[] {
  const { building, name, directions, runId } = sheet;
  const title = [building.id, name].filter((part) => part !== null).join(' ');
  const alike = JSON.stringify(directions.longitudinal) === JSON.stringify(directions.transverse);
  return [
    ...wrap(clean(title), columns).map((line) => styled('bold', line)),
    ...wrap(clean(`${systemSentence(sheet)} Run ${String(runId)}.`), columns),
    ...(alike
      ? ['', styled('bold', 'Both directions alike'), ...estimateLines(directions.longitudinal, columns)]
      : (['longitudinal', 'transverse'] as const).flatMap((direction) => [
          '',
          styled('bold', direction === 'longitudinal' ? 'Longitudinal' : 'Transverse'),
          ...estimateLines(directions[direction], columns),
        ])),
    '',
    ...wrap(
      'Range: 16th to 84th percentile of the method error, or the band of the values a stiffness route assumes where that is wider. Laws and measurements of small amplitude are lengthened for strong shaking.',
      columns,
    ),
  ];
}

function systemSentence({ system, systemTransverse, systemFrom, chance }: PeriodSheet): string {
  const both = system === systemTransverse ? system : `${system} along and ${systemTransverse} across`;
  if (systemFrom === 'given') return `Lateral system ${both}, given.`;
  if (systemFrom === 'asked') return `As if the lateral system were ${system}.`;
  return `The lateral system is not on record; shown for the likeliest, ${both} (chance ${formatShare(chance)}). --system names another.`;
}

interface Row {
  readonly estimate: Estimate;
  readonly outcome: AppliedEstimate;
}

/** The parts of the table, each with what its rows are there for. */
const PARTS: readonly (readonly [string, readonly EstimateKind[]])[] = [
  ['What counts, and its checks', ['used', 'measured', 'stiffness', 'standard']],
  ['Formulas of other standards, for comparison', ['other standard']],
  ['Research, for comparison', ['regression']],
];

function estimateLines(estimates: readonly Estimate[], columns: number): string[] {
  const rows = estimates.flatMap((estimate): Row[] =>
    estimate.outcome.applies ? [{ estimate, outcome: estimate.outcome }] : [],
  );
  const unusable = new Map<string, string[]>();
  for (const { id, outcome } of estimates) {
    if (!outcome.applies) unusable.set(outcome.reason, [...(unusable.get(outcome.reason) ?? []), id]);
  }
  return [
    ...PARTS.flatMap(([title, kinds], part) => {
      const own = rows.filter(({ estimate }) => kinds.includes(estimate.kind));
      if (own.length === 0) return [];
      return ['', `  ${title}`, ...(part === 0 ? countedLines(own, columns) : comparedLines(own, columns))];
    }),
    ...(unusable.size === 0 ? [] : ['', '  Not applicable here']),
    ...[...unusable].flatMap(([reason, ids]) => wrap(clean(`${reason}: ${ids.join(', ')}`), columns, '    ', '      ')),
  ];
}

const seconds = (value: number): string => formatNumber(value, 3);
const range = ({ low_s, high_s }: AppliedEstimate): string => `${seconds(low_s)} to ${seconds(high_s)}`;
const nameOf = ({ kind, id, title }: Pick<Estimate, 'kind' | 'id' | 'title'>): string => (kind === 'used' ? title : id);

function countedLines(rows: readonly Row[], columns: number): string[] {
  const head = [
    { title: 'Estimate', shrinkTo: 26 },
    { title: 'T (s)', right: true },
    { title: 'Range (s)' },
    { title: 'Fitted for', spare: 1 },
    { title: 'Part' },
  ];
  const cells = rows.map(({ estimate, outcome }) => [
    nameOf(estimate),
    seconds(outcome.period_s),
    range(outcome),
    estimate.basis,
    estimate.kind === 'used' ? '' : outcome.counts ? 'counts' : 'check',
  ]);
  const why = rows.flatMap(({ estimate, outcome }) =>
    wrap(clean(`${nameOf(estimate)}: ${[outcome.why, ...outcome.notes].join('; ')}`), columns, '    ', '      '),
  );
  return [...table(head, cells, columns, '    '), ...why];
}

/** Editions that give the same period share a line. */
function comparedLines(rows: readonly Row[], columns: number): string[] {
  const lines = new Map<string, Row[]>();
  for (const row of rows) {
    const key = [seconds(row.outcome.period_s), row.estimate.basis, ...row.outcome.notes].join();
    lines.set(key, [...(lines.get(key) ?? []), row]);
  }
  return [...lines.values()].flatMap((alike) => {
    const [{ estimate, outcome }] = alike as [Row, ...Row[]];
    const notes = [`fitted for ${BASIS_WORDS[estimate.basis] ?? estimate.basis}`, ...outcome.notes].join('; ');
    return wrap(
      clean(
        `${seconds(outcome.period_s)} s (${range(outcome)}): ${alike.map((row) => row.estimate.id).join(', ')} [${notes}]`,
      ),
      columns,
      '    ',
      '      ',
    );
  });
}

const BASIS_WORDS: Readonly<Record<string, string>> = {
  design: 'design',
  'best-fit': 'the best estimate',
  ambient: 'small amplitude',
};

function classLines(
  { runId, system, group, buildings, directions, estimates }: PeriodClass,
  columns: number,
): string[] {
  const where = group === null ? '' : ` in ${group}`;
  const parts = PARTS.flatMap(([title, kinds], part) => {
    const own = estimates.filter(({ kind, applies }) => applies > 0 && kinds.includes(kind));
    if (own.length === 0) return [];
    return ['', `  ${title}`, ...(part === 0 ? classTable(own, columns) : alikeLines(own, columns))];
  });
  const never = new Map<string, string[]>();
  for (const { id, applies, why } of estimates) {
    if (applies === 0) never.set(why, [...(never.get(why) ?? []), id]);
  }
  return [
    styled('bold', clean(`${system}${where}`)),
    ...wrap(
      `${formatCount(buildings)} ranked ${buildings === 1 ? 'building' : 'buildings'} with that system on record in run ${String(runId)}: ${formatCount(directions)} directions.`,
      columns,
    ),
    ...parts,
    ...(never.size === 0 ? [] : ['', '  Applies to none of them']),
    ...[...never].flatMap(([reason, ids]) => wrap(clean(`${reason}: ${ids.join(', ')}`), columns, '    ', '      ')),
    '',
    ...wrap(
      'Applies and counts: directions of buildings; the range holds 80 % of them. Over used: median of the estimate over the period used. Another system across a building is another class.',
      columns,
    ),
  ];
}

function classTable(own: readonly ClassEstimate[], columns: number): string[] {
  const head = [
    { title: 'Estimate', shrinkTo: 20 },
    { title: 'Applies', right: true },
    { title: 'Counts', right: true },
    { title: 'T (s)', right: true },
    { title: 'Range (s)' },
    { title: 'Over used', right: true },
  ];
  const why = own.flatMap((each) =>
    each.kind === 'used' ? [] : wrap(clean(`${each.id}: ${each.why}`), columns, '    ', '      '),
  );
  return [...table(head, own.map(classRow), columns, '    '), ...why];
}

const classRange = ({ p10_s, p90_s }: ClassEstimate): string => `${seconds(p10_s)} to ${seconds(p90_s)}`;

function classRow(each: ClassEstimate): string[] {
  const used = each.kind === 'used';
  return [
    nameOf(each),
    formatCount(each.applies),
    used ? '' : formatCount(each.counts),
    seconds(each.median_s),
    classRange(each),
    used ? '' : formatNumber(each.over_used, 3),
  ];
}

/** Formulas that give the same share a line, with their names in full. */
function alikeLines(own: readonly ClassEstimate[], columns: number): string[] {
  const lines = new Map<string, string[]>();
  for (const each of own) {
    const over = `${formatNumber(each.over_used, 3)} of the period used`;
    const text = `${seconds(each.median_s)} s (${classRange(each)}), ${over}, in ${formatCount(each.applies)}`;
    lines.set(text, [...(lines.get(text) ?? []), each.id]);
  }
  return [...lines].flatMap(([text, ids]) => wrap(clean(`${text}: ${ids.join(', ')}`), columns, '    ', '      '));
}
