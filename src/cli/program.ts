/** The command line: what all commands share, and the groups they come in. Each loads its own code when it runs, so that `--help` loads none. */
import { Command, CommanderError } from 'commander';
import type { Argument } from 'commander';
import { EXIT } from '../errors.js';
import { VERSION } from '../screening/version.js';
import { addCompareCommand } from './groups/compare.js';
import { addDecisionCommands } from './groups/decide.js';
import { addHistoryCommands } from './groups/history.js';
import { addMeasureCommand } from './groups/measure.js';
import { addMethodCommands } from './groups/methods.js';
import { examples } from './groups/options.js';
import { addRefreshCommand } from './groups/refresh.js';
import { addRunCommands } from './groups/runs.js';
import { addStudyCommands } from './groups/study.js';
import { printError, terminalColumns } from './output/print.js';
import { styled } from './output/style.js';

const CAUTION =
  'Swaymark orders buildings for further assessment; it makes no statement on the\nsafety of any of them. Local codes govern, and a licensed engineer decides.';

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
  addHistoryCommands(program, keep);
  addCompareCommand(program, keep);
  addDecisionCommands(program, keep);
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
