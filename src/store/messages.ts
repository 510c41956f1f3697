import { Bug, UserError } from '../errors.js';

/** A query was stopped by `interrupt()`. */
export class Interrupted extends Error {
  override readonly name = 'Interrupted';
}

const LONGEST = 300;

interface Known {
  readonly pattern: RegExp;
  readonly say: (match: RegExpExecArray) => string;
}

// The engine's errors carry no code, so they are told apart by their text.
const KNOWN: readonly Known[] = [
  {
    pattern: /Could not set lock on file/,
    say: () => 'the database is in use by another process; wait until it ends or close it',
  },
  {
    pattern: /not a valid DuckDB database file|Could not read enough bytes|serialization version|Corrupt database/,
    say: () => 'this is not a database swaymark can read; move it away or rename it, and a new one is made',
  },
  { pattern: /database does not exist/, say: () => 'there is no database here yet; run `swaymark screen` first' },
  {
    pattern: /version number (\d+)|created with a newer version|newer version of DuckDB/,
    say: () =>
      'the database was written by a newer program; update swaymark, or move the file away and a new one is made',
  },
  {
    pattern: /attached in read-only mode/,
    say: () => 'the database is open for reading only',
  },
  {
    pattern: /Out of Memory|could not allocate|failed to pin block/i,
    say: () => 'not enough memory; close other programs or work on a smaller inventory',
  },
  { pattern: /No space left on device/, say: () => 'the disk is full; free some space and run again' },
  { pattern: /Permission denied|Cannot open file.*denied/i, say: () => 'no permission to read or write this file' },
  {
    pattern: /Cannot open file "[^"]*": (No such file or directory|Is a directory)/,
    say: (match) => `the file cannot be opened (${match[1]?.toLowerCase() ?? 'unknown'})`,
  },
];

/** The engine's message cut to 300 characters: it may quote a whole line of data. */
export function cutMessage(message: string): string {
  return message.length <= LONGEST ? message : `${message.slice(0, LONGEST)}…`;
}

/** What the database engine threw, in our words: a UserError for what a person can mend, else a Bug. */
export function translateError(error: unknown, file: string | undefined): Error {
  if (error instanceof UserError || error instanceof Bug || error instanceof Interrupted) return error;
  const message = error instanceof Error ? error.message : String(error);
  if (message.startsWith('INTERRUPT')) return new Interrupted('stopped');
  const place = file === undefined ? {} : { file };
  for (const { pattern, say } of KNOWN) {
    const match = pattern.exec(message);
    if (match !== null) return new UserError(say(match), place, { cause: cutMessage(message) });
  }
  return new Bug(`database: ${cutMessage(message)}`);
}
