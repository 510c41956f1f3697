/** The way from a table to a ranking: init, check, screen. */
import type { Command } from 'commander';
import { examples, json, units } from './options.js';
import type { Keep } from './options.js';

export function addStudyCommands(program: Command, keep: Keep): void {
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
      keep((await import('../commands/init.js')).init(table, options));
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
      keep(await (await import('../commands/check.js')).check(file, options));
    });
  program
    .command('screen')
    .summary('rank the buildings, keep the run, write the reports')
    .description(
      'Takes in the inventory, assesses and ranks every building, keeps the run in study.duckdb and writes dashboard.html, summary.md, ranking.csv, ranking.parquet and rejects.csv; where there are sites of several buildings, sites.csv; where neighbours stand too close, gaps.csv.',
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
      keep(await (await import('../commands/screen.js')).screen(file, options));
    });
}
