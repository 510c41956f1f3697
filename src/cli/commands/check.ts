import { EXIT } from '../../errors.js';
import { checkStudy } from '../../exports/check-study.js';
import type { CheckedStudy } from '../../exports/check-study.js';
import { heightUnitSentence } from '../../reports/dashboard/answers.js';
import { interruptible } from '../interrupt.js';
import { printError, printJson, printLines, terminalColumns } from '../output/print.js';
import { progressLine } from '../output/progress.js';
import { styled } from '../output/style.js';
import { clean, wrap } from '../output/text.js';
import { accountBlock, attributeBlock, findingBlock, overLimit } from './quality.js';

const DELIMITERS: Readonly<Record<string, string>> = { ',': 'commas', ';': 'semicolons', tab: 'tabs', '|': 'bars' };

/** `swaymark check`: intake and data quality only. */
export async function check(
  file: string,
  options: { readonly output?: string; readonly units: 'si' | 'us'; readonly json?: true },
): Promise<number> {
  const progress = progressLine();
  return interruptible(
    async ({ onOpen, check: checkStop }) => {
      try {
        const checked = await checkStudy(file, {
          output: options.output,
          onOpen,
          onProgress: (step) => {
            checkStop();
            progress.update(step);
          },
        });
        progress.end();
        if (options.json) printJson(checked);
        else printLines(lines(checked, file, terminalColumns(), options.units));
        return checked.rejected.over ? EXIT.findings : EXIT.clean;
      } finally {
        progress.end();
      }
    },
    () => {
      printError('stopped');
    },
  );
}

function lines(checked: CheckedStudy, file: string, columns: number, display: 'si' | 'us'): string[] {
  const { title, encoding, delimiter, rows_in, buildings, account, attributes, findings, rejected, files } = checked;
  return [
    styled('bold', clean(title)),
    ...wrap(
      clean(`${checked.file}, read as ${encoding}, cells parted by ${DELIMITERS[delimiter] ?? delimiter}`),
      columns,
    ),
    '',
    ...accountBlock(rows_in, buildings, account),
    '',
    ...attributeBlock(attributes, columns),
    '',
    ...(findings.length === 0
      ? ['Nothing was found amiss.']
      : [styled('bold', 'Findings'), ...findingBlock(findings, columns, display)]),
    '',
    ...[heightUnitSentence(checked), checked.not_rankable, checked.off_grid].flatMap((sentence) =>
      sentence === '' ? [] : [...wrap(clean(sentence), columns), ''],
    ),
    ...(rejected.over ? wrap(overLimit(rejected), columns) : []),
    ...files.map((path) => `written: ${clean(path)}`),
    ...(rejected.over ? [] : wrap(`Nothing is kept. Next: swaymark screen ${clean(file)}`, columns)),
  ];
}
