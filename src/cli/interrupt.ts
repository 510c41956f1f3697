/** What Ctrl-C does while the database works. */
import { Interrupted } from '../store/messages.js';
import type { Database } from '../store/database.js';

const EXIT_INTERRUPTED = 130;

export interface Interruption {
  readonly onOpen: (db: Database) => void;
  /** To be called between pieces of work. @throws Interrupted once asked to stop. */
  readonly check: () => void;
}

/**
 * Runs `work`; the first SIGINT or SIGTERM interrupts the running statement, so that its transaction is rolled back, the second ends at once.
 * @returns what `work` returns, or 130 when it was interrupted.
 */
export async function interruptible(
  work: (interruption: Interruption) => Promise<number>,
  onStop: () => void,
): Promise<number> {
  let open: Database | undefined;
  let stopped = false;
  const stop = (): void => {
    if (stopped) process.exit(EXIT_INTERRUPTED);
    stopped = true;
    open?.interrupt();
  };
  process.on('SIGINT', stop);
  process.on('SIGTERM', stop);
  const check = (): void => {
    if (stopped) throw new Interrupted('stopped');
  };
  try {
    return await work({
      onOpen: (db) => {
        open = db;
      },
      check,
    });
  } catch (error) {
    if (!(error instanceof Interrupted)) throw error;
    onStop();
    return EXIT_INTERRUPTED;
  } finally {
    process.off('SIGINT', stop);
    process.off('SIGTERM', stop);
  }
}
