/** The command measure. */
import { Option } from 'commander';
import type { Command } from 'commander';
import type { MeasureCommandOptions } from '../commands/measure.js';
import { band, examples, json, positive, seconds } from './options.js';
import type { Keep } from './options.js';

export function addMeasureCommand(program: Command, keep: Keep): void {
  program
    .command('measure')
    .summary('a vibration record to a period')
    .description(
      'Finds the fundamental period of a building in a record of its vibration, ambient or a free decay, with its damping and how sure both are, and prints the row for the inventory.',
    )
    .argument('<record>', 'CSV file: a line a sample, with a time column or --rate-hz')
    .option('--channel <column>', 'column measured, by name or number (default: the first beside time)')
    .option('--time <column>', 'column of time, in seconds or as clock times, by name or number')
    .option('--rate-hz <number>', 'sampling rate, instead of a time column', positive)
    .addOption(
      new Option('--kind <kind>', 'what the record is (default: judged from the data)').choices(['ambient', 'decay']),
    )
    .option('--from-s <seconds>', 'leave out what is before, counted from the first sample', seconds)
    .option('--to-s <seconds>', 'leave out what is after', positive)
    .option('--band-hz <low:high>', 'where to look for the peak (default: 0.1 to 25 Hz, as the record allows)', band)
    .option('--window-s <seconds>', 'length of a window (default: to suit the peak)', positive)
    .addOption(
      new Option('--direction <direction>', 'direction of the row for the inventory').choices([
        'longitudinal',
        'transverse',
      ]),
    )
    .option('--id <building>', 'id of the building in that row')
    .option('--svg <file>', 'draw the spectrum there')
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark measure roof.csv',
        'swaymark measure roof.csv --channel acc_y --id BH-012 --svg roof.svg',
        'swaymark measure pull.csv --rate-hz 200 --kind decay',
      ),
    )
    .action(async (file: string, options: MeasureCommandOptions) => {
      keep(await (await import('../commands/measure.js')).measure(file, options));
    });
}
