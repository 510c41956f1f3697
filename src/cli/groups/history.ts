/** The runs kept for a study: list, show, note, delete. */
import type { Command } from 'commander';
import type { RunsOptions } from '../commands/runs.js';
import { examples, json, study, wholeNumber } from './options.js';
import type { Keep } from './options.js';

export function addHistoryCommands(program: Command, keep: Keep): void {
  const runs = program
    .command('runs')
    .summary('the runs kept for a study: list, show, note, delete')
    .description(
      'Lists the runs kept in study.duckdb with their notes and fingerprints; or shows, notes or deletes some. Study files of one folder share it: a run is of the file it was made with, by its name, also when that was edited since.',
    )
    .enablePositionalOptions()
    .helpCommand('help [command]', 'print help for a command')
    .addOption(study())
    .addOption(json())
    .addHelpText(
      'after',
      examples('swaymark runs --study town/study.yaml', 'swaymark runs show 2', 'swaymark runs delete 1 3'),
    )
    .action(async (options: RunsOptions) => {
      keep(await (await import('../commands/runs.js')).runs(options));
    });
  // Options may stand before the subcommand too: `runs --study x.yaml show 2`.
  const all = (command: Command): RunsOptions & { yes?: true } => command.optsWithGlobals();
  const number = (text: string, before: readonly number[] = []): readonly number[] => [...before, wholeNumber(text)];
  runs
    .command('show')
    .summary('everything kept about a run')
    .description(
      'Shows when and by what a run was made, its fingerprints, counts and account of rows, its list, and what differs in the settings from the run before.',
    )
    .argument('<run>', 'number of the run', wholeNumber)
    .addOption(study())
    .addOption(json())
    .addHelpText('after', examples('swaymark runs show 2'))
    .action(async (run: number, _options: unknown, command: Command) => {
      keep(await (await import('../commands/runs.js')).showOneRun(run, all(command)));
    });
  runs
    .command('note')
    .summary('put another note to a run')
    .description("Puts the text in the place of the run's note; an empty text leaves it without one.")
    .argument('<run>', 'number of the run', wholeNumber)
    .argument('<text>', 'the note')
    .addOption(study())
    .addOption(json())
    .addHelpText('after', examples('swaymark runs note 1 "before the survey of block 4"'))
    .action(async (run: number, text: string, _options: unknown, command: Command) => {
      keep(await (await import('../commands/runs.js')).noteOneRun(run, text, all(command)));
    });
  runs
    .command('delete')
    .summary('delete runs and what only they use')
    .description(
      'Deletes runs with their results, and the inventories kept with them that no other run uses. Says what goes and asks; their numbers are not given again, and reports on the disk stay.',
    )
    .argument('<run...>', 'numbers of the runs', number)
    .option('--yes', 'delete without asking')
    .addOption(study())
    .addOption(json())
    .addHelpText('after', examples('swaymark runs delete 1 3', 'swaymark runs delete 2 --yes'))
    .action(async (ids: readonly number[], _options: unknown, command: Command) => {
      keep(await (await import('../commands/runs-delete.js')).deleteRuns(ids, all(command)));
    });
}
