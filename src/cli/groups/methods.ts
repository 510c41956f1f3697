/** The register of methods and the spectra: methods, calc, spectrum. */
import type { Command } from 'commander';
import type { SpectrumCommandOptions } from '../commands/spectrum.js';
import { degrees, examples, json, periods, study, units } from './options.js';
import type { Keep } from './options.js';

export function addMethodCommands(program: Command, keep: Keep): void {
  program
    .command('methods')
    .summary('the register of published methods')
    .description(
      'Lists every method the program can apply, those that hold some words, or one of them in full: formula, inputs, units, limits, clause, and how its numbers were come by.',
    )
    .argument('[words...]', 'an id: that method in full; other words: the methods that hold all of them')
    .option('--left-out', 'published rows that are no method here, with the reason')
    .addOption(json())
    .addHelpText(
      'after',
      examples('swaymark methods', 'swaymark methods period wall', 'swaymark methods asce7-22/period/other'),
    )
    .action(async (words: string[], options: { json?: true; leftOut?: true }) => {
      keep((await import('../commands/methods.js')).methods(words, options));
    });
  program
    .command('calc')
    .summary('one method by itself')
    .description(
      'Evaluates one method. Quantities may be given in any unit the program knows, named at the end of the input: height_m=28.3 or height_ft=93.',
    )
    .argument('<method-id>', 'id of the method (swaymark methods lists them)')
    .argument('[inputs...]', 'name=value; lists as 200,200,180; without inputs it says what it needs')
    .option('--svg <file>', 'for a spectrum: its picture, with a dot at the period')
    .addOption(units())
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark calc asce7-22/period/other height_ft=93',
        'swaymark calc en1998-1-2004/spectrum/elastic-type-1 ag_g=0.25 ground=C \\\n    period_s=0.8 --svg spectrum.svg',
        'swaymark calc mechanics/period/general-chain masses_t=200,200,180 \\\n    storey_stiffness_MN_per_m=90,80,80',
      ),
    )
    .action(async (id: string, inputs: string[], options: { units: 'si' | 'us'; json?: true; svg?: string }) => {
      keep(await (await import('../commands/calc.js')).calc(id, inputs, options));
    });
  program
    .command('spectrum')
    .summary("the study's spectra and their ordinates")
    .argument('[names...]', 'one spectrum: parameters, corners, ordinates; several: side by side')
    .addOption(study())
    .option('--at <periods>', 'periods in seconds, for instance 0.2,1', periods)
    .option('--lon <degrees>', 'with --lat: the place at which hazard grids are read', degrees(360))
    .option('--lat <degrees>', 'its latitude', degrees(90))
    .option('--csv <file>', 'the ordinates as a table, at --at or at periods that draw the curve')
    .option('--svg <file>', 'the curves as a picture, with dots at --at')
    .addOption(units())
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark spectrum',
        'swaymark spectrum design-c --at 0.2,1',
        'swaymark spectrum hazard-475 --lon 13.42 --lat 43.61',
        'swaymark spectrum design-c design-d --svg spectra.svg --csv spectra.csv',
      ),
    )
    .action(async (names: string[], options: SpectrumCommandOptions) => {
      keep(await (await import('../commands/spectrum.js')).spectrum(names, options));
    });
}
