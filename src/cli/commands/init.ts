import { existsSync, writeFileSync } from 'node:fs';
import { basename, dirname, join, relative, resolve } from 'node:path';
import { EXIT, UserError } from '../../errors.js';
import { proposeStudy } from '../../inventory/propose-study.js';
import { setAtPath } from '../../study/edit.js';
import { studyJsonSchema } from '../../study/schema.js';
import { printLines, terminalColumns } from '../output/print.js';
import { styled } from '../output/style.js';
import { table as tableLines } from '../output/table.js';
import { clean, wrap } from '../output/text.js';

/** The JSON Schema of study files, for editors. */
const SCHEMA_FILE = 'study.schema.json';

/** `swaymark init`: a proposed study file for a table; it never replaces a file. */
export function init(table: string, options: { readonly output?: string }): number {
  const target = options.output ?? join(dirname(table), 'study.yaml');
  const taken = (cause?: unknown): UserError =>
    new UserError(
      'this file exists already and is not replaced; name another with --output',
      { file: target },
      { cause },
    );
  if (existsSync(target)) throw taken();
  const { text, questions, proposal } = proposeStudy(table);
  // The proposal names the table as its neighbour; a study elsewhere must find it too.
  const from = relative(dirname(resolve(target)), resolve(table));
  const body = from === basename(table) ? text : setAtPath(text, 'inventory.file', from.replaceAll('\\', '/'));
  write(target, `# yaml-language-server: $schema=./${SCHEMA_FILE}\n${body}`, taken);
  // The schema is ours, not the user's: a fresh copy every time.
  writeFileSync(join(dirname(target), SCHEMA_FILE), `${JSON.stringify(studyJsonSchema(), null, 2)}\n`);

  const columns = terminalColumns();
  const head = [
    { title: 'Ours' },
    { title: 'Column of the table', shrinkTo: 12 },
    { title: 'Unit' },
    { title: 'Open question', shrinkTo: 20, spare: 1 },
  ];
  const rows = proposal.columns.map(({ ours, theirs, unit, question }) => [ours, theirs, unit ?? '', question ?? '']);
  printLines([
    `Proposed: ${clean(target)} (${SCHEMA_FILE} beside it lets an editor check it)`,
    '',
    ...tableLines(head, rows, columns),
    ...(proposal.unused.length === 0
      ? []
      : ['', ...wrap(clean(`Not used: ${proposal.unused.join(', ')}`), columns, '', '  ')]),
    '',
    ...questionLines(questions, columns),
    ...wrap(
      `Next: answer the lines marked QUESTION in ${clean(target)}, then run swaymark check ${clean(target)}`,
      columns,
    ),
  ]);
  return EXIT.clean;
}

const SHOWN = 12;

function questionLines(questions: readonly string[], columns: number): string[] {
  if (questions.length === 0) return [];
  // Questions on single words make sense only beside their word, in the file.
  const own = questions.filter((question) => !/^\d+ sampled rows; /.test(question));
  const words = questions.length - own.length;
  const more = own.length - SHOWN;
  return [
    styled('bold', questions.length === 1 ? '1 open question' : `${String(questions.length)} open questions`),
    ...own.slice(0, SHOWN).flatMap((question) => wrap(clean(question), columns, '  - ', '    ')),
    ...(more > 0 ? [`  and ${String(more)} more in the file`] : []),
    ...(words > 0
      ? [
          `  - what ${String(words)} ${words === 1 ? 'word' : 'words'} of the table stand for: confirm or correct them in the file`,
        ]
      : []),
    '',
  ];
}

function write(target: string, text: string, taken: (cause: unknown) => UserError): void {
  try {
    writeFileSync(target, text, { flag: 'wx' });
  } catch (cause) {
    const { code } = cause as NodeJS.ErrnoException;
    if (code === 'EEXIST') throw taken(cause);
    if (code === 'ENOENT') throw new UserError('no such folder; make it first', { file: dirname(target) }, { cause });
    if (code === 'EACCES' || code === 'EROFS')
      throw new UserError('no permission to write here', { file: target }, { cause });
    throw cause;
  }
}
