/** The accuracy page as Markdown. */
import { MEASURED_BUILDINGS } from '../reference/measured-buildings.js';
import { outside, spreadOf } from '../support/engineering-measured.js';
import type { Accuracy, Kind } from './figures.js';

const KINDS: Readonly<Record<Kind, string>> = {
  printed: 'printed in the publication',
  restated: 'restated by another publication',
  memory: 'recalled',
  'own arithmetic': 'our own arithmetic',
};

/** A relative error: two digits, and 0 under what a double can tell. */
export function share(value: number): string {
  if (value < 1e-12) return '0';
  return value >= 1e-4 ? `${(value * 100).toPrecision(2)} %` : `${(value * 100).toExponential(0)} %`;
}

const cell = (text: string): string => text.replaceAll('|', '\\|');

/** Measured buildings: no formula has to hit one, so what is said is who lies inside half to twice the measurement, and who outside. */
function measuredLines(): string[] {
  const rows = MEASURED_BUILDINGS.map((one) => {
    const { formulas, least, most } = spreadOf(one);
    const out = outside(one);
    const height =
      one.height_m === null
        ? 'not seen'
        : `${String(one.height_m)} m${one.heightMark === 'memory' ? ' (from memory)' : ''}`;
    const periods = one.periods_s.map((period_s) => period_s.toFixed(2)).join(' and ');
    return `| ${one.id} | ${one.what} | ${height} | ${periods} s, ${one.excitation} | ${String(formulas)} | ${least.toFixed(2)} to ${most.toFixed(2)} | ${out.length === 0 ? 'none' : `${String(out.length)}: ${out.join(', ')}`} |`;
  });
  return [
    '## Measured buildings',
    '',
    'Formula over measured period, each formula that the height and storeys of the case allow; small-amplitude laws and measurements are',
    'brought to the same amplitude first. A single building may lie anywhere in the scatter of a law; named are the formulas outside half',
    'to twice the measurement.',
    '',
    '| case | building | height | measured | formulas | formula over measured | outside 0.5 to 2 |',
    '|---|---|---|---|--:|---|---|',
    ...rows,
    '',
  ];
}

/** The page's text. */
export function accuracyPage(figures: Accuracy): string {
  const { totals, rows, constants, guarded, unguarded } = figures;
  const lines = [
    '# Accuracy of the methods',
    '',
    'Made by `npm run accuracy`; a test holds this page against the code. Every record of the register is evaluated at inputs whose',
    'answer is known from somewhere else, and the relative error |computed − expected| / |expected| is stated. An answer printed to few',
    'digits cannot show a small error: most of what is seen is the rounding of the printed answer.',
    '',
    '**Whose answer it is** matters: a number *printed* in the publication, *restated* by another publication or *recalled* from memory',
    'comes from outside; *our own arithmetic* is the stated formula worked a second time and guards only against slips of the code.',
    '',
    '| answer | cases | methods | within tolerance | mean error | 90th percentile | largest |',
    '|---|--:|--:|--:|--:|--:|--:|',
    ...totals.map(
      (t) =>
        `| ${KINDS[t.kind]} | ${String(t.n)} | ${String(t.methods)} | ${String(t.within)} | ${share(t.mean)} | ${share(t.p90)} | ${share(t.max)} |`,
    ),
    '',
    ...measuredLines(),
    '## What no outside answer guards',
    '',
    `Every number of every record was changed by 1 %, one at a time: ${String(constants)} numbers. ${String(guarded)} of the changes made a case fail whose`,
    `answer we did not compute ourselves; ${String(constants - guarded)} did not, in ${String(unguarded.length)} records. These rest on their source and on our own arithmetic alone:`,
    '',
    '| record | numbers | the record is | why |',
    '|---|---|---|---|',
    ...unguarded.map(
      ({ method, verified, constants: names, why }) => `| \`${method}\` | ${names.join(', ')} | ${verified} | ${why} |`,
    ),
    '',
    '## By method and source',
    '',
    '| record | answer | n | mean | 90th | largest | source |',
    '|---|---|--:|--:|--:|--:|---|',
    ...rows.map(
      (r) =>
        `| \`${r.method}\` | ${r.kind} | ${String(r.n)} | ${share(r.mean)} | ${share(r.p90)} | ${share(r.max)} | ${cell(r.sources.slice(0, 3).join('; '))}${r.sources.length > 3 ? `; and ${String(r.sources.length - 3)} more` : ''} |`,
    ),
  ];
  return `${lines.join('\n')}\n`;
}
