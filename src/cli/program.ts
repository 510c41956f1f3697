/** The commands, their options and their help. Each loads its own code when it runs, so that `--help` loads none. */
import { Command, CommanderError, InvalidArgumentError, Option } from 'commander';
import type { Argument } from 'commander';
import { EXIT } from '../errors.js';
import { printError, terminalColumns } from './output/print.js';
import { styled } from './output/style.js';
import type { CompareCommandOptions } from './commands/compare.js';
import type { MeasureCommandOptions } from './commands/measure.js';
import type { RefreshCommandOptions } from './commands/refresh.js';
import type { SpectrumCommandOptions } from './commands/spectrum.js';
import type { SurveyCommandOptions } from './commands/survey.js';
import type { RunsOptions } from './commands/runs.js';
import { VERSION } from '../screening/version.js';

const CAUTION =
  'Swaymark orders buildings for further assessment; it makes no statement on the\nsafety of any of them. Local codes govern, and a licensed engineer decides.';

function wholeNumber(text: string): number {
  const value = Number(text);
  if (!/^\d+$/.test(text) || value < 1 || value > Number.MAX_SAFE_INTEGER)
    throw new InvalidArgumentError('Expected a whole number from 1.');
  return value;
}

function periods(text: string): number[] {
  return text.split(/[,;]/).map((part) => {
    const value = Number(part);
    if (part.trim() === '' || !(value >= 0 && value < Infinity))
      throw new InvalidArgumentError('Expected periods in seconds, for instance 0.2,1.');
    return value;
  });
}

/** A coordinate of at most so many degrees, east and north positive. */
function degrees(most: number): (text: string) => number {
  return (text) => {
    const value = Number(text);
    if (text.trim() === '' || !(Math.abs(value) <= most))
      throw new InvalidArgumentError(`Expected degrees, -${String(most)} to ${String(most)}.`);
    return value;
  };
}

function positive(text: string): number {
  const value = Number(text);
  if (text.trim() === '' || !(value > 0 && value < Infinity))
    throw new InvalidArgumentError('Expected a number over 0.');
  return value;
}

function seconds(text: string): number {
  const value = Number(text);
  if (text.trim() === '' || !(value >= 0 && value < Infinity))
    throw new InvalidArgumentError('Expected seconds, 0 or more.');
  return value;
}

function band(text: string): [number, number] {
  const [low = NaN, high = NaN, ...more] = text.split(':').map((part) => (part.trim() === '' ? NaN : Number(part)));
  if (!(low > 0 && high > low && high < Infinity) || more.length > 0)
    throw new InvalidArgumentError('Expected two frequencies, the lower first, for instance 0.5:3.');
  return [low, high];
}

const units = (): Option => new Option('--units <system>', 'units of the output').choices(['si', 'us']).default('si');
const json = (): Option => new Option('--json', 'print JSON');
const study = (): Option =>
  new Option('--study <file>', 'the study file (default: study.yaml, or the only .yaml file here)');
const run = (): Option => new Option('--run <number>', 'the run (default: the newest)').argParser(wholeNumber);

function examples(...lines: readonly string[]): string {
  return `\n${styled('bold', lines.length > 1 ? 'Examples:' : 'Example:')}\n${lines.map((line) => `  ${line}`).join('\n')}`;
}

/** Runs the command line. @returns the exit code. @throws whatever a command throws. */
export async function runProgram(argv: readonly string[]): Promise<number> {
  if (argv.includes('--no-color')) process.env['NO_COLOR'] = '1';
  const program = build();
  let code: number = EXIT.clean;
  const keep = (value: number | undefined): void => {
    code = value ?? EXIT.clean;
  };
  addStudyCommands(program, keep);
  addRefreshCommand(program, keep);
  addRunCommands(program, keep);
  addCompareCommand(program, keep);
  addSurveyCommand(program, keep);
  addMethodCommands(program, keep);
  addMeasureCommand(program, keep);
  try {
    await program.parseAsync([...argv]);
    return code;
  } catch (error) {
    if (!(error instanceof CommanderError)) throw error;
    return error.exitCode === 0 ? EXIT.clean : EXIT.user;
  }
}

function build(): Command {
  const program = new Command('swaymark');
  program
    .description(
      'Ranks existing buildings for detailed seismic assessment by the spectral demand their own periods draw.',
    )
    .version(VERSION, '--version', 'print the version')
    .option('--no-color', 'plain output, as with NO_COLOR')
    .helpOption('--help', 'print help')
    .helpCommand('help [command]', 'print help for a command')
    .exitOverride()
    .configureOutput({
      writeErr: (text) => {
        printError(text.trimEnd());
      },
      getOutHelpWidth: terminalColumns,
      getErrHelpWidth: terminalColumns,
      getOutHasColors: () => true,
      outputError: (text, write) => {
        write(text.replace(/^error: /, ''));
      },
    })
    .configureHelp({
      styleTitle: (title) => styled('bold', title),
      subcommandTerm: (command) => [command.name(), ...command.registeredArguments.map(argumentTerm)].join(' '),
    })
    .showHelpAfterError('(swaymark --help lists the commands; swaymark <command> --help explains one)')
    .addHelpText(
      'after',
      `${examples(
        'swaymark init buildings.csv            # propose a study for a table',
        'swaymark check study.yaml              # what the inventory holds and lacks',
        'swaymark screen study.yaml             # rank, and write the dashboard',
        'swaymark refresh --set ranking.k=3     # rank again with a changed parameter',
        'swaymark explain BH-012                # one building by hand',
        'swaymark calc asce7-22/period/other height_ft=93',
      )}\n\n${CAUTION}`,
    );
  return program;
}

function argumentTerm(argument: Argument): string {
  const name = `${argument.name()}${argument.variadic ? '...' : ''}`;
  return argument.required ? `<${name}>` : `[${name}]`;
}

type Keep = (code: number | undefined) => void;

function addStudyCommands(program: Command, keep: Keep): void {
  program
    .command('init')
    .summary('propose a study file for a table of buildings')
    .description(
      'Reads a table and proposes a study file: which column is what, in which unit, with the open questions marked. Applies nothing.',
    )
    .argument('<table>', 'CSV file of the inventory')
    .option('--output <file>', 'the study file to write; it must not exist (default: study.yaml beside the table)')
    .addHelpText(
      'after',
      examples('swaymark init town.csv', 'swaymark init exports/assets.csv --output assets/study.yaml'),
    )
    .action(async (table: string, options: { output?: string }) => {
      keep((await import('./commands/init.js')).init(table, options));
    });
  program
    .command('check')
    .summary('take in the inventory and report its quality')
    .description(
      'Takes in the inventory and says what became of every row, what is given, inferred, defaulted or unknown, and what was found. Keeps nothing.',
    )
    .argument('<study>', 'the study file')
    .option('--output <folder>', 'write rejects.csv there')
    .addOption(units())
    .addOption(json())
    .addHelpText(
      'after',
      `${examples('swaymark check study.yaml', 'swaymark check study.yaml --output checked')}\n\nExit code 1 when more rows are rejected than inventory.rejects_limit allows.`,
    )
    .action(async (file: string, options: { output?: string; units: 'si' | 'us'; json?: true }) => {
      keep(await (await import('./commands/check.js')).check(file, options));
    });
  program
    .command('screen')
    .summary('rank the buildings, keep the run, write the reports')
    .description(
      'Takes in the inventory, assesses and ranks every building, keeps the run in study.duckdb and writes dashboard.html, ranking.csv, ranking.parquet, rejects.csv and summary.md.',
    )
    .argument('<study>', 'the study file')
    .option('--note <text>', 'a note kept with the run', '')
    .option('--output <folder>', "folder of the reports (default: the study's)")
    .addOption(units())
    .addOption(json())
    .addHelpText(
      'after',
      `${examples('swaymark screen study.yaml', 'swaymark screen study.yaml --note "after the survey of block 4" --units us')}\n\nExit code 1 when more rows are rejected than inventory.rejects_limit allows; 130 when interrupted.`,
    )
    .action(async (file: string, options: { note: string; output?: string; units: 'si' | 'us'; json?: true }) => {
      keep(await (await import('./commands/screen.js')).screen(file, options));
    });
}

function addRefreshCommand(program: Command, keep: Keep): void {
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
      keep(await (await import('./commands/refresh.js')).refresh(options));
    });
}

function addRunCommands(program: Command, keep: Keep): void {
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
      keep(await (await import('./commands/explain.js')).explain(id, options));
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
        keep(await (await import('./commands/periods.js')).periods(id, options));
      },
    );
  addHistoryCommands(program, keep);
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
      keep(await (await import('./commands/review.js')).review(options));
    });
}

function addCompareCommand(program: Command, keep: Keep): void {
  program
    .command('compare')
    .summary('two runs side by side: who moved, and why')
    .description(
      'Compares two runs: who entered and left the list, how alike the orders are, and each move explained: the parts of its change of ln S, its own change against those of the others, what differs in data, settings and methods. Writes a page with the before-and-after picture.',
    )
    .argument('[before]', 'the earlier run (default: the one before the later)', wholeNumber)
    .argument('[after]', 'the later run (default: the newest)', wholeNumber)
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
      keep(await (await import('./commands/compare.js')).compare(before, after, options));
    });
}

function addSurveyCommand(program: Command, keep: Keep): void {
  program
    .command('survey')
    .summary('which building to visit next, and for what')
    .description(
      'Plans the visits that firm up the list most for what they cost: building, what to find out, by which kind of visit, until hours or money are spent. Costs and what a visit finds out are set in the study under survey.',
    )
    .option('--hours <number>', 'hours there are for visits', positive)
    .option('--money <number>', "money there is for visits, in the study's currency", positive)
    .addOption(study())
    .addOption(run())
    .option('--csv <file>', 'the plan as a sheet to fill in')
    .option('--output <folder>', 'folder of the page (default: that of the reports)')
    .option('--no-page', 'write no page')
    .addOption(json())
    .addHelpText('after', examples('swaymark survey --hours 16', 'swaymark survey --hours 40 --csv field.csv'))
    .action(async (options: SurveyCommandOptions) => {
      keep(await (await import('./commands/survey.js')).survey(options));
    });
}

function addHistoryCommands(program: Command, keep: Keep): void {
  const runs = program
    .command('runs')
    .summary('the runs kept for a study: list, show, note, delete')
    .description(
      'Lists the runs kept in study.duckdb with their notes and fingerprints; or shows, notes or deletes some.',
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
      keep(await (await import('./commands/runs.js')).runs(options));
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
      keep(await (await import('./commands/runs.js')).showOneRun(run, all(command)));
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
      keep(await (await import('./commands/runs.js')).noteOneRun(run, text, all(command)));
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
      keep(await (await import('./commands/runs-delete.js')).deleteRuns(ids, all(command)));
    });
}

function addMethodCommands(program: Command, keep: Keep): void {
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
      keep((await import('./commands/methods.js')).methods(words, options));
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
      keep(await (await import('./commands/calc.js')).calc(id, inputs, options));
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
      keep(await (await import('./commands/spectrum.js')).spectrum(names, options));
    });
}

function addMeasureCommand(program: Command, keep: Keep): void {
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
      keep(await (await import('./commands/measure.js')).measure(file, options));
    });
}
