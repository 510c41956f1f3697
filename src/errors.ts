/** Exit codes of the command: clean; findings (rejects over the limit, movement); the user's to mend; a bug of ours. */
export const EXIT = { clean: 0, findings: 1, user: 2, bug: 70 } as const;

/** Where something is wrong: line and column count from 1, row is the row as the person sees it in the file. */
export interface Place {
  readonly file?: string | undefined;
  readonly line?: number | undefined;
  readonly column?: number | undefined;
  /** Dotted key in a study file, for instance `hazard.spectra.design.code`. */
  readonly key?: string | undefined;
  readonly row?: number | undefined;
  readonly columnName?: string | undefined;
}

/** One thing to mend; the message says what is wrong, with the value, then what is allowed, and leaves out the place. */
export interface Problem {
  readonly place: Place;
  readonly message: string;
}

/** Something the user can mend; carries every problem found, so that all are reported at once. */
export class UserError extends Error {
  override readonly name = 'UserError';
  readonly exitCode = EXIT.user;
  readonly problems: readonly Problem[];

  /** `options.cause` keeps the error of a library underneath for debugging; it is not shown. */
  constructor(message: string, place: Place = {}, options: { cause?: unknown; problems?: readonly Problem[] } = {}) {
    super(message, 'cause' in options ? { cause: options.cause } : undefined);
    this.problems = options.problems ?? [{ place, message }];
  }

  /** Where the first problem is. */
  get place(): Place {
    return this.problems[0]?.place ?? {};
  }

  /**
   * One error for all of `problems`, in the order given.
   * @throws Bug when the list is empty.
   */
  static of(problems: readonly Problem[]): UserError {
    const [first] = problems;
    if (first === undefined) throw new Bug('UserError.of: no problem given');
    const message = problems.length === 1 ? first.message : `${problems.length} problems, the first: ${first.message}`;
    return new UserError(message, first.place, { problems: [...problems] });
  }
}

/** A broken promise inside swaymark: nothing the user could have done differently. */
export class Bug extends Error {
  override readonly name = 'Bug';
  readonly exitCode = EXIT.bug;
}

const LONGEST_VALUE = 200;

/** A value as it may stand in a message: text quoted, control characters escaped, cut to 200 characters. */
export function showValue(value: unknown): string {
  // By code points, so that the cut never halves a character.
  if (typeof value === 'string') return printable(JSON.stringify(cut(value)));
  if (typeof value === 'object' && value !== null) return printable(cut(asJson(value)));
  if (typeof value === 'function' || typeof value === 'symbol') return typeof value;
  return String(value);
}

/** The exit code an error deserves: its own for ours, 70 for anything unforeseen. */
export function exitCodeOf(error: unknown): number {
  return error instanceof UserError || error instanceof Bug ? error.exitCode : EXIT.bug;
}

/**
 * One line per problem, *place: what is wrong; what is allowed*, safe to print on a terminal.
 * @example
 * formatError(new UserError('unknown code "x"', { file: 'study.yaml', line: 14, column: 9, key: 'hazard.code' }));
 * // 'study.yaml:14:9 hazard.code: unknown code "x"'
 */
export function formatError(error: unknown): string {
  if (error instanceof UserError) return error.problems.map(formatProblem).join('\n');
  const message = error instanceof Error ? error.message : showValue(error);
  return printable(`a bug in swaymark: ${message}; please report it with the command you ran`);
}

function formatProblem({ place, message }: Problem): string {
  const where = formatPlace(place);
  return printable(where === '' ? message : `${where}: ${message}`);
}

function formatPlace({ file, line, column, key, row, columnName }: Place): string {
  const position = [file, line, line === undefined ? undefined : column].filter((part) => part !== undefined).join(':');
  const cell = [row === undefined ? '' : `row ${row}`, columnName === undefined ? '' : `column ${columnName}`];
  return [position, cell.filter((part) => part !== '').join(', '), key ?? ''].filter((part) => part !== '').join(' ');
}

function cut(text: string): string {
  if (text.length <= LONGEST_VALUE) return text;
  const characters = Array.from(text.slice(0, 2 * LONGEST_VALUE + 2));
  return characters.length <= LONGEST_VALUE ? text : `${characters.slice(0, LONGEST_VALUE).join('')}…`;
}

function asJson(value: object): string {
  try {
    return JSON.stringify(value) ?? typeof value;
  } catch {
    // A cycle or a bigint inside: its kind is all a message can say.
    return Array.isArray(value) ? 'a list' : 'an object';
  }
}

// Line breaks become spaces; the other control characters, and those that reverse reading order, go.
function printable(text: string): string {
  return text.replace(/[\s\u0085]+/gu, ' ').replace(/[\p{Cc}\u202a-\u202e\u2066-\u2069]/gu, '');
}
