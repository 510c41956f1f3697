/** The command compare. */
import type { Command } from 'commander';
import type { CompareCommandOptions } from '../commands/compare.js';
import { examples, json, study, wholeNumber } from './options.js';
import type { Keep } from './options.js';

export function addCompareCommand(program: Command, keep: Keep): void {
  program
    .command('compare')
    .summary('two runs side by side: who moved, and why')
    .description(
      'Compares two runs: who entered and left the list, how alike the orders are, and each move explained: the parts of its change of ln S, its own change against those of the others, what differs in data, settings and methods. Writes a page with the before-and-after picture.',
    )
    .argument('[before]', 'the earlier run (default: the one before the later)', wholeNumber)
    .argument('[after]', 'the later run (default: the newest of the study)', wholeNumber)
    .addOption(study())
    .option('--other-study <file>', 'the study file of the later run, where it is of another study')
    .option('--most <number>', 'other large moves explained besides those of the lists', wholeNumber, 20)
    .option('--output <folder>', "folder of the page (default: the study's)")
    .option('--no-page', 'write no page')
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark compare                       # the two newest runs',
        'swaymark compare 1 3 --no-page',
        'swaymark compare --study town-2013/study.yaml --other-study town-2014/study.yaml',
      ),
    )
    .action(async (before: number | undefined, after: number | undefined, options: CompareCommandOptions) => {
      keep(await (await import('../commands/compare.js')).compare(before, after, options));
    });
}
