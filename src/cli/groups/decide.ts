/** What a ranking is for: survey, budget, sensitivity. */
import { InvalidArgumentError } from 'commander';
import type { Command } from 'commander';
import type { BudgetCommandOptions } from '../commands/budget.js';
import type { SensitivityCommandOptions } from '../commands/sensitivity.js';
import type { SurveyCommandOptions } from '../commands/survey.js';
import { examples, json, positive, run, study, wholeNumber } from './options.js';
import type { Keep } from './options.js';

function money(text: string): number {
  const value = Number(text);
  if (!/^\d+(?:\.\d+)?(?:e\d+)?$/i.test(text.trim()) || !(value > 0 && value <= 1e12))
    throw new InvalidArgumentError(
      'Expected a plain number over 0, at most 1e12, without separators or a currency: 180000.',
    );
  return value;
}

function ids(text: string): string[] {
  const list = text.split(',').map((part) => part.trim());
  if (list.some((id) => id === ''))
    throw new InvalidArgumentError('Expected ids of the register of assumptions, for instance slope,system-prior.');
  return list;
}

export function addDecisionCommands(program: Command, keep: Keep): void {
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
    .option('--take <file>', 'bring the answers of a filled-in sheet back into the study')
    .option('--answers', 'list the answers that the study holds')
    .option('--withdraw <id>', 'withdraw the answers for a building')
    .option('--question <name>', 'withdraw those to one question alone: system, height, height_m, …')
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark survey --hours 16',
        'swaymark survey --hours 40 --csv field.csv',
        'swaymark survey --take field.csv',
        'swaymark survey --answers',
        'swaymark survey --withdraw BH-012 --question system',
      ),
    )
    .action(async (options: SurveyCommandOptions) => {
      // what plans loads all that draws its page: answers need none of it
      const job = (await import('../commands/survey-answers.js')).answersJob(options);
      keep(await (job === null ? (await import('../commands/survey.js')).survey(options) : job()));
    });
  program
    .command('budget')
    .summary('the assessments that a sum of money buys')
    .description(
      "Chooses out of a kept run the buildings to assess for a sum of money: the largest sum of chance of belonging to the list × priority. Costs, buildings that must or must not be among them, and blocks that cost a mobilisation once stand in the study's section budget. Says how far from the best possible the choice is at most. Keeps nothing.",
    )
    .option('--money <sum>', "the sum, a plain number (default: the study's budget.money)", money)
    .addOption(study())
    .addOption(run())
    .option('--csv <file>', 'write the choice as a table')
    .addOption(json())
    .addHelpText(
      'after',
      `${examples('swaymark budget --money 180000', 'swaymark budget --money 25000.50 --run 3 --csv assessments.csv')}\n\nExit code 1 when the money buys no assessment.`,
    )
    .action(async (options: BudgetCommandOptions) => {
      keep(await (await import('../commands/budget.js')).budget(options));
    });
  program
    .command('sensitivity')
    .summary('which assumptions the list hangs on')
    .description(
      'Ranks the buildings of a kept run again with each assumption of its register switched, one at a time, and shows how the list changes, the largest effect first; names the buildings that stay on the list whatever is assumed. Keeps nothing.',
    )
    .option('--only <ids>', 'only these assumptions, by their ids in the register', ids)
    .option('--sample <number>', 'rank a systematic sample of about so many buildings', wholeNumber)
    .addOption(study())
    .addOption(run())
    .option('--csv <file>', 'write the table of switches')
    .addOption(json())
    .addHelpText(
      'after',
      examples(
        'swaymark sensitivity',
        'swaymark sensitivity --only slope,system-prior',
        'swaymark sensitivity --sample 50000 --csv sensitivity.csv',
      ),
    )
    .action(async (options: SensitivityCommandOptions) => {
      keep(await (await import('../commands/sensitivity.js')).sensitivity(options));
    });
}
