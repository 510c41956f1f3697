/** A question on the terminal. */
import { createInterface } from 'node:readline';

/**
 * Asks on `output` and reads one line of `input`: true for y or yes in any case. An ended input and Ctrl-C are a no.
 */
export function askYes(
  question: string,
  input: NodeJS.ReadableStream = process.stdin,
  output: NodeJS.WritableStream = process.stderr,
): Promise<boolean> {
  const reader = createInterface({ input, output });
  return new Promise((resolve) => {
    const end = (answer: boolean): void => {
      resolve(answer);
      reader.close();
    };
    reader.once('close', () => {
      end(false);
    });
    reader.question(`${question} [y/N] `, (answer) => {
      end(/^y(es)?$/i.test(answer.trim()));
    });
  });
}
