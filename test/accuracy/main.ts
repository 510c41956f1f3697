/** Writes the accuracy page and prints its heads: what `npm run accuracy` runs. */
import { writeFileSync } from 'node:fs';
import { accuracy } from './figures.js';
import { accuracyPage } from './page.js';

const path = process.argv[2] ?? 'docs/accuracy.md';
const text = accuracyPage(await accuracy());
writeFileSync(path, text);
process.stdout.write(`${text.slice(0, text.indexOf('## Measured buildings'))}\nwritten: ${path}\n`);
