// Writes the invented portfolio. node data-demo/make.mjs [output folder] [--summary]
// The same seed gives the same bytes on every Node version. SOURCES.md says what is in it.
import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { addBehaviour } from './making/behaviour.mjs';
import { drawBuildings } from './making/buildings.mjs';
import { inventoryCsv, plainCsv } from './making/csv.mjs';
import { addDirt } from './making/dirt.mjs';
import { layOut } from './making/layout.mjs';
import { headers, ownerRow } from './making/owner.mjs';
import { quarters } from './making/places.mjs';
import { priorHeaders, priorRows } from './making/prior.mjs';
import { makeRandom } from './making/random.mjs';
import { addStructure, structureHeaders } from './making/structure.mjs';
import { printSummary } from './making/summary.mjs';

const seed = 20260611;
// The structure columns came later: a stream of their own leaves every older cell as it was.
const structureSeed = 20261201;
const blankAfter = 118;
const random = makeRandom(seed);

drawBuildings(random, quarters);
const pairs = layOut(random, quarters);
const lots = quarters.flatMap((quarter) => quarter.lots);
const next = { BH: 0, SC: 0 };
for (const lot of lots) {
  const prefix = lot.quarter.name.startsWith('Saltmarsh') ? 'SC' : 'BH';
  next[prefix] += 1;
  lot.id = `${prefix}-${`${1000 + next[prefix]}`.slice(1)}`;
}
addBehaviour(random, lots);
const entries = lots.map((lot) => ({ lot, row: ownerRow(random, lot) }));
const { rows, notes, touched, loneLineFeeds } = addDirt(random, entries);
addStructure(makeRandom(structureSeed), rows, entries, (row) => touched.has(row), notes);

const nameless = new Set(entries.filter((entry) => entry.row['Asset no.'] === '').map((entry) => entry.lot));
const aligned = (a, b) => {
  const ratio = a.floorHeight / b.floorHeight;
  return ratio > 0.95 && ratio < 1.05 ? 'yes' : 'no';
};
const neighbours = pairs.filter(({ a, b }) => !nameless.has(a) && !nameless.has(b)).map(({ a, b, gap_m }) => [a.id, b.id, gap_m.toFixed(2), aligned(a, b)]);

const words = process.argv.slice(2).filter((word) => word !== '--summary');
const folder = words[0] ?? dirname(fileURLToPath(import.meta.url));
mkdirSync(folder, { recursive: true });
const lone = new Set(loneLineFeeds.map((row) => rows.indexOf(row)));
writeFileSync(join(folder, 'inventory.csv'), inventoryCsv([...headers, ...structureHeaders], rows, blankAfter, lone));
writeFileSync(join(folder, 'neighbours.csv'), plainCsv(['id_a', 'id_b', 'gap_m', 'floors_aligned'], neighbours));
writeFileSync(join(folder, 'system-prior.csv'), plainCsv(priorHeaders, priorRows()));
if (process.argv.includes('--summary')) printSummary({ rows, notes, entries, lone, blankAfter, neighbours });
