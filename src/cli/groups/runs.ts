/** What a kept run tells of its buildings: explain, periods, review. */
import type { Command } from 'commander';
import { examples, json, run, study, units, wholeNumber } from './options.js';
import type { Keep } from './options.js';

export function addRunCommands(program: Command, keep: Keep): void {
  program
    .command('explain')
    .summary('the hand calculation of one building')
    .description(
      'Prints how a building came to its place: every value with its origin, every choice, every formula with its numbers and clause.',
    )
    .argument('<building>', 'identifier of the building')
    .addOption(study())
    .addOption(run())
    .addOption(units())
    .addOption(json())
    .addHelpText(
      'after',
      examples('swaymark explain BH-012', 'swaymark explain BH-012 --study town/study.yaml --run 3 --units us'),
    )
    .action(async (id: string, options: { study?: string; run?: number; units: 'si' | 'us'; json?: true }) => {
      keep(await (await import('../commands/explain.js')).explain(id, options));
    });
  program
    .command('periods')
    .summary('every estimate of a period side by side')
    .description(
      'Lists every applicable estimate of the period of one building, or of all buildings of one lateral system: measured, from stiffness, by the formulas of the chosen standard, of other standards and of research, with its range; which of them count and why, and why the others do not apply.',
    )
    .argument('[building]', 'identifier of the building')
    .option(
      '--system <system>',
      'a class: the buildings of that lateral system; with a building: as if it were of that system',
    )
    .option('--block <name>', 'of a class, only the buildings of this block or zone')
    .addOption(study())
    .addOption(run())
    .addOption(json())
    .addHelpText('after', examples('swaymark periods BH-012', 'swaymark periods --system concrete-moment-frame'))
    .action(
      async (
        id: string | undefined,
        options: { system?: string; block?: string; study?: string; run?: number; json?: true },
      ) => {
        keep(await (await import('../commands/periods.js')).periods(id, options));
      },
    );
  program
    .command('review')
    .summary('a sheet for checking some buildings by hand')
    .description(
      'Draws ranked buildings by lot and writes review.csv: every formula step with its clause and inputs, and blank cells for an independent value.',
    )
    .requiredOption('--sample <number>', 'how many buildings', wholeNumber)
    .option('--output <folder>', "folder of review.csv (default: the study's)")
    .addOption(study())
    .addOption(run())
    .addOption(units())
    .addHelpText('after', examples('swaymark review --sample 10'))
    .action(async (options: { sample: number; output?: string; study?: string; run?: number; units: 'si' | 'us' }) => {
      keep(await (await import('../commands/review.js')).review(options));
    });
}
