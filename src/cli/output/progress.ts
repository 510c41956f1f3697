/** One line of progress on a terminal's standard error; nothing in a pipe. */
import { fit, pad } from './text.js';

const EVERY_MS = 100;

export interface ProgressLine {
  readonly update: (progress: { readonly step: string; readonly share: number }) => void;
  /** Wipes the line. */
  readonly end: () => void;
}

/** Redraws at most ten times a second, so that drawing costs nothing. */
export function progressLine(
  stream: NodeJS.WriteStream = process.stderr,
  now: () => number = () => performance.now(),
): ProgressLine {
  if (!stream.isTTY) return { update: () => undefined, end: () => undefined };
  let drawn = -Infinity;
  let last = '';
  return {
    update: ({ step, share }) => {
      const time = now();
      // A new step is worth a line even within the pause, but never twice in a row faster than the eye.
      if (time - drawn < EVERY_MS) return;
      drawn = time;
      const columns = (stream.columns || 80) - 1;
      last = fit(
        Number.isNaN(share) ? step : `${step} ${pad(`${String(Math.floor(share * 100))} %`, 5, true)}`,
        columns,
      );
      stream.write(`\r\u001b[K${last}`);
    },
    end: () => {
      if (last !== '') stream.write('\r\u001b[K');
      last = '';
    },
  };
}
