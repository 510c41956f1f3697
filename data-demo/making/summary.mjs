// Counts for whoever keeps SOURCES.md true: node data-demo/make.mjs --summary
import { sheetRow } from './csv.mjs';

const count = (list, key) => {
  const out = {};
  for (const item of list) out[key(item)] = (out[key(item)] ?? 0) + 1;
  return out;
};

/** Prints the town as it truly is, what the file says of it, and every piece of dirt with its row. */
export function printSummary({ rows, notes, entries, lone, blankAfter, neighbours }) {
  const buildings = entries.map((entry) => entry.lot).filter((lot) => lot.kind !== 'yard');
  const at = (row) => sheetRow(rows.indexOf(row), blankAfter);
  const rowsWhere = (test) => rows.filter(test).map(at).join(' ');
  console.log('data rows', rows.length, '| lots', entries.length, '| neighbours', neighbours.length);
  console.log('by quarter', count(rows, (row) => row.Quarter));
  console.log('true system', count(buildings, (lot) => lot.system));
  console.log('structure as written', count(rows, (row) => row.Structure));
  console.log('true storeys', count(buildings, (lot) => lot.storeys));
  console.log('true era', count(buildings, (lot) => Math.floor(lot.year / 20) * 20));
  console.log('year 1900', rowsWhere((row) => row.Built === '1900'));
  console.log('open yards', rowsWhere((row) => row.Use === 'open yard'));
  console.log('storeys 0', rowsWhere((row) => row.Storeys === '0'));
  const filled = {};
  for (const header of Object.keys(rows[0])) filled[header] = rows.filter((row) => row[header] !== '').length;
  console.log('filled cells', filled);
  for (const { row, column, what } of notes) console.log(`| ${at(row)} | ${row['Asset no.']} | ${column} | ${what} |`);
  console.log('line feed alone after rows', [...lone].map((index) => sheetRow(index, blankAfter)).join(' '), '| empty line is row', blankAfter + 2);
}
