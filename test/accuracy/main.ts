/** Writes the accuracy page and prints its figures: what `npm run accuracy` runs. */
import { writeFileSync } from 'node:fs';
import { accuracy } from './figures.js';
import type { ErrorRow } from './figures.js';
import { accuracyPage, share } from './page.js';

const path = process.argv[2] ?? 'docs/accuracy.md';
const figures = await accuracy();
const text = accuracyPage(figures);
writeFileSync(path, text);

const line = ({ method, kind, n, mean, p90, max, sources }: ErrorRow): string =>
  [
    method.padEnd(64),
    kind.padEnd(15),
    String(n).padStart(3),
    share(mean).padStart(9),
    share(p90).padStart(9),
    share(max).padStart(9),
    ` ${(sources[0] ?? '').slice(0, 60)}`,
  ].join(' ');
const head = ['method'.padEnd(64), 'answer'.padEnd(15), '  n', '     mean', '      p90', '      max', ' source'].join(
  ' ',
);
process.stdout.write(`${[head, ...figures.rows.map(line)].join('\n')}\n\n`);
process.stdout.write(`${text.slice(text.indexOf('| answer |'), text.indexOf('## Measured buildings'))}`);
process.stdout.write(
  `${String(figures.constants)} numbers changed by 1 %: ${String(figures.guarded)} guarded by an outside answer, ${String(figures.constants - figures.guarded)} not (${String(figures.unguarded.length)} records, listed on the page)\nwritten: ${path}\n`,
);
