/** The command refresh. */
import type { Command } from 'commander';
import type { RefreshCommandOptions } from '../commands/refresh.js';
import { examples, json, run, study, units } from './options.js';
import type { Keep } from './options.js';

export function addRefreshCommand(program: Command, keep: Keep): void {
  program
    .command('refresh')
    .summary('rank again with changed parameters, without reading the inventory')
    .description(
      'Ranks the buildings kept with an earlier run by the study file as it stands, with parameters changed by --set or those of another study file, and keeps a new run: the same as a whole screening with these parameters. The inventory file is not read and may be gone. With --sweep it ranks over a range and shows how the list changes, and keeps nothing.',
    )
    .option(
      '--set <path=value>',
      'a parameter of the study by its path; repeatable',
      (text: string, before: readonly string[]) => [...before, text],
      [] as readonly string[],
    )
    .option('--with <file>', 'another study file of the same folder, whose parameters are used')
    .option('--sweep <path=from:to:step>', 'a range of one parameter: a table of how the list changes, no run')
    .addOption(study())
    .addOption(run())
    .option('--write', 'write the parameters of --set into the study file; comments stay')
    .option('--note <text>', 'a note kept with the run', '')
    .option('--no-reports', 'leave the reports as they are')
    .option('--output <folder>', "folder of the reports (default: the study's)")
    .addOption(units())
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark refresh --set hazard.spectra.design.sds_g=1.2',
        'swaymark refresh --set ranking.list_size=30 --set ranking.rank_by=ratio --write',
        'swaymark refresh --with study-new-map.yaml --note "the map of next year"',
        'swaymark refresh --sweep hazard.spectra.design.sd1_g=0.3:0.9:0.1',
      ),
    )
    .action(async (options: RefreshCommandOptions) => {
      keep(await (await import('../commands/refresh.js')).refresh(options));
    });
}
