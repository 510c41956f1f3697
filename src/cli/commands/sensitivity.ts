import { relative } from 'node:path';
import { formatCount, formatNumber, formatShare } from '../../engineering/format.js';
import { EXIT } from '../../errors.js';
import { sensitivityStudy } from '../../exports/sensitivity-study.js';
import type { HeldPlace, Sensitivity, SwitchEffect } from '../../screening/sensitivity.js';
import type { WeighedPlace, WeightSpace } from '../../screening/weights.js';
import { findStudy } from '../find-study.js';
import { interruptible } from '../interrupt.js';
import { printError, printJson, printLines, terminalColumns } from '../output/print.js';
import { progressLine } from '../output/progress.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

export interface SensitivityCommandOptions {
  readonly study?: string;
  readonly run?: number;
  readonly only?: readonly string[];
  readonly sample?: number;
  readonly csv?: string;
  readonly json?: true;
}

/** Buildings named of each kind; the JSON has all. */
const NAMED = 60;
/** Below it nobody needs to be told how long it takes. */
const WORTH_TELLING_S = 30;

/** `swaymark sensitivity`: every assumption switched, one at a time. */
export async function sensitivity(options: SensitivityCommandOptions): Promise<number> {
  const study = findStudy(options.study);
  const { run, only, sample, csv } = options;
  const progress = progressLine();
  return interruptible(
    async ({ onOpen, check }) => {
      try {
        const found = await sensitivityStudy(study, {
          ...{ run, only, sample, csv, onOpen },
          onProgress: (step) => {
            check();
            progress.update(step);
          },
          onEstimate: (rankings, seconds) => {
            if (seconds < WORTH_TELLING_S) return;
            progress.end();
            printError(
              `${formatCount(rankings)} rankings, about ${durationWords(seconds)}; --only names some assumptions, --sample ranks a part of the buildings`,
            );
          },
        });
        progress.end();
        if (options.json) printJson(found);
        else printLines(lines(found, csv, terminalColumns()));
        return EXIT.clean;
      } finally {
        progress.end();
      }
    },
    () => {
      printError('stopped; nothing is kept, runs and files are as they were');
    },
  );
}

function durationWords(seconds: number): string {
  return seconds < 90 ? `${formatNumber(seconds, 2)} s` : `${formatNumber(seconds / 60, 2)} min`;
}

function lines(found: Sensitivity, csv: string | undefined, columns: number): string[] {
  return [
    ...wrap(headSentence(found), columns),
    ...(found.sample === null ? [] : wrap(sampleSentence(found), columns)),
    '',
    ...table(
      [
        // whole: it is what --only takes
        { title: 'Assumption' },
        { title: 'Was', shrinkTo: 10, spare: 1 },
        { title: 'Switched to', shrinkTo: 26 },
        { title: 'Mark', spare: 2 },
        { title: 'Overlap', right: true },
        { title: 'Tau-b', right: true },
      ],
      found.switches.map((one) => [one.assumption, one.from, one.to, one.mark, overlapOf(one), tauOf(one)]),
      columns,
    ),
    '',
    ...wrap(
      'Overlap: places of the list held by buildings that are on the list of the run too. Tau-b: rank correlation of all buildings ranked both times, 1 where the order is the same.',
      columns,
    ),
    '',
    ...placeLines(found, columns),
    ...weightLines(found, columns),
    ...leftLines(found, columns),
    ...(csv === undefined ? [] : [`Written: ${clean(relative(process.cwd(), csv) || csv)}`, '']),
    ...wrap('An order for further assessment, not a statement on the safety of any building.', columns),
  ];
}

function headSentence({ run, rankings, places, always }: Sensitivity): string {
  return `Run ${String(run)} ranked again with ${formatCount(rankings)} ${rankings === 1 ? 'switch of an assumption' : 'switches of assumptions'}, one at a time: ${formatCount(always.length)} of the ${formatCount(places)} on the list stay whichever of them is made.`;
}

function sampleSentence({ sample, buildings, places }: Sensitivity): string {
  if (sample === null) return '';
  const few = places < 20 ? ' With so few places read the tau-b rather than the overlap.' : '';
  return `This is a sample: every ${formatCount(sample.every)}th building by id, ${formatCount(sample.buildings)} of ${formatCount(buildings)}, with a list of ${formatCount(places)} in place of ${formatCount(sample.list_size)}.${few}`;
}

function overlapOf({ overlap, places, places_before }: SwitchEffect): string {
  return `${formatCount(overlap)} of ${formatCount(Math.max(places, places_before))}`;
}

function tauOf({ tau_b }: SwitchEffect): string {
  return tau_b === null ? 'none' : tau_b.toFixed(3);
}

function placeLines({ always, sometimes, outside, rankings }: Sensitivity, columns: number): string[] {
  const named = (title: string, places: readonly HeldPlace[], words: (one: HeldPlace) => string): string[] => {
    if (places.length === 0) return [];
    const text = places.slice(0, NAMED).map(words).join(', ');
    const more = places.length > NAMED ? ` and ${formatCount(places.length - NAMED)} more` : '';
    return [styled('bold', title), ...wrap(clean(`${text}${more}`), columns, '  '), ''];
  };
  const counted = ({ id, held }: HeldPlace): string => `${id} ${formatCount(held)}`;
  return [
    ...named('On the list whichever is switched', always, ({ id }) => id),
    ...named(`On the list, and in how many of the ${formatCount(rankings)} it stays`, sometimes, counted),
    ...named(`Not on the list, and in how many of the ${formatCount(rankings)} it enters`, outside, counted),
  ];
}

function weightLines({ weights }: Sensitivity, columns: number): string[] {
  if (weights === null) return [];
  const { listed, outside } = weights;
  const counted = ({ id, share }: WeighedPlace): string => `${id} ${formatShare(share)}`;
  const list = (title: string, places: readonly WeighedPlace[]): string[] => {
    if (places.length === 0) return [];
    const more = places.length > NAMED ? ` and ${formatCount(places.length - NAMED)} more` : '';
    return [
      ...wrap(title, columns),
      ...wrap(clean(`${places.slice(0, NAMED).map(counted).join(', ')}${more}`), columns, '  '),
    ];
  };
  return [
    styled('bold', 'Weights together'),
    ...wrap(weightSentence(weights), columns),
    ...list(
      'Listed, and in how many of the weightings:',
      listed.filter(({ share }) => share < 1),
    ),
    ...list('Not listed, and in how many they enter:', outside),
    '',
  ];
}

function weightSentence({ draws, people, importance, slope, safe, safe_share, places }: WeightSpace): string {
  const range = ([low, high]: readonly [number, number]): string =>
    `${formatNumber(low, 2)} to ${formatNumber(high, 2)}`;
  return `${formatCount(draws)} weightings, exponent of the people ${range(people)}, of the importance ${range(importance)}, slope ${slope === null ? 'as read' : range(slope)}, drawn evenly: ${formatCount(safe)} of the ${formatCount(places)} on the list are on it in ${formatShare(safe_share)} of them or more.`;
}

function leftLines({ not_switched }: Sensitivity, columns: number): string[] {
  if (not_switched.length === 0) return [];
  return [
    styled('bold', 'Not switched'),
    ...not_switched.flatMap(({ assumption, why }) => wrap(clean(`${assumption}: ${why}`), columns, '  ', '      ')),
    '',
  ];
}
