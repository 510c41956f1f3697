/** What leaves the program. */

/** Columns of the terminal; some report 0, a pipe reports none. */
export function terminalColumns(): number {
  return process.stdout.columns || Number(process.env['COLUMNS']) || 80;
}

/** Writes lines to standard output. */
export function printLines(lines: readonly string[]): void {
  process.stdout.write(lines.map((line) => `${line.trimEnd()}\n`).join(''));
}

/** Writes a value to standard output as JSON; NaN and infinities as null. */
export function printJson(value: unknown): void {
  process.stdout.write(`${JSON.stringify(value, null, 2)}\n`);
}

/** Writes one message to standard error. */
export function printError(message: string): void {
  process.stderr.write(`${message}\n`);
}
