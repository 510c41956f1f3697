/** What `check` and `screen` both say of an inventory. */
import { formatCount, formatShare, textInDisplay } from '../../engineering/format.js';
import type { Display } from '../../engineering/format.js';
import type { AccountLine, AttributeCount, FindingCount } from '../../engineering/page-contract.js';
import { styled } from '../output/style.js';
import { table } from '../output/table.js';
import { clean, pad, wrap } from '../output/text.js';

/** The account of rows: every row has one fate, so the lines sum to the rows read. */
export function accountBlock(rowsIn: number, buildings: number, account: readonly AccountLine[]): string[] {
  const shown = account.filter(({ rows }) => rows > 0);
  const columns = Math.max(...[rowsIn, ...shown.map(({ rows }) => rows)].map((rows) => formatCount(rows).length));
  const line = (count: number, words: string): string => `  ${pad(formatCount(count), columns, true)}  ${words}`;
  return [
    line(
      rowsIn,
      `${rowsIn === 1 ? 'row' : 'rows'} read, making ${formatCount(buildings)} ${buildings === 1 ? 'building' : 'buildings'}:`,
    ),
    ...shown.map(({ rows, title }) => line(rows, rows === 1 ? singular(title) : title)),
  ];
}

function singular(title: string): string {
  return title
    .replace(/^rows of (ranked )?buildings/, (_, ranked: string | undefined) => `row of a ${ranked ?? ''}building`)
    .replace(/^rows of sites/, 'row of a site')
    .replace(/^rows/, 'row')
    .replace(/^exact duplicates of other rows/, 'exact duplicate of another row')
    .replace(/buildings? that lack\b/, 'building that lacks');
}

/** Per attribute how many buildings have it given, inferred, by default, or not at all. */
export function attributeBlock(attributes: readonly AttributeCount[], columns: number): string[] {
  const counts = (row: AttributeCount): string[] =>
    [row.given, row.inferred, row.default, row.unknown].map((count) => (count === 0 ? '·' : formatCount(count)));
  const head = ['given', 'inferred', 'default', 'unknown'].map((title) => ({ title, right: true }));
  return table(
    [{ title: 'Attribute', shrinkTo: 16 }, ...head],
    attributes.map((row) => [row.title, ...counts(row)]),
    columns,
    '  ',
  );
}

const KINDS: Readonly<Record<string, string>> = {
  'rejected-row': 'row rejected',
  'rejected-cell': 'value rejected',
  note: 'note',
};

/** Findings by code, each with its first example. */
export function findingBlock(findings: readonly FindingCount[], columns: number, display: Display): string[] {
  return findings.flatMap(({ code, kind, count, example }) => [
    `  ${pad(formatCount(count), 6, true)}  ${styled('bold', clean(code))}  (${KINDS[kind] ?? kind})`,
    ...wrap(clean(textInDisplay(example, display)), columns, '          ', '          '),
  ]);
}

/** The sentence on rejected rows, when they are over the limit. */
export function overLimit({ share, limit }: { readonly share: number; readonly limit: number }): string {
  return `${formatShare(share)} of the rows were rejected, more than the ${formatShare(limit)} that inventory.rejects_limit allows.`;
}
