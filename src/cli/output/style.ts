/** Emphasis on a terminal that takes it. */
import { styleText } from 'node:util';

type Emphasis = 'bold' | 'dim';
interface Stream {
  readonly isTTY?: boolean;
}

/** Whether `stream` takes escape codes: NO_COLOR and `--no-color` forbid them, FORCE_COLOR asks for them, else a terminal does. */
export function takesStyle(stream: Stream, env: NodeJS.ProcessEnv = process.env): boolean {
  if ((env['NO_COLOR'] ?? '') !== '') return false;
  const forced = env['FORCE_COLOR'];
  if (forced !== undefined) return forced !== '0' && forced !== 'false';
  return stream.isTTY === true && env['TERM'] !== 'dumb';
}

/** `text` set off, where standard output takes it. */
export function styled(emphasis: Emphasis, text: string): string {
  return takesStyle(process.stdout) ? styleText(emphasis, text, { validateStream: false }) : text;
}
