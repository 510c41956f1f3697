import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { accuracy, guards } from './figures.js';
import { accuracyPage } from './page.js';

describe('accuracyPage', () => {
  it('stands in docs as npm run accuracy writes it', async () => {
    expect(readFileSync('docs/accuracy.md', 'utf8')).toBe(accuracyPage(await accuracy()));
  });
});

describe('accuracy', () => {
  it('counts every case once and finds all of them within their tolerance', async () => {
    const { totals, rows } = await accuracy();
    const cases = totals.reduce((sum, { n }) => sum + n, 0);
    expect(rows.reduce((sum, { n }) => sum + n, 0)).toBe(cases);
    for (const { n, within } of totals) expect(within).toBe(n);
  });
});

describe('guards', () => {
  it('calls a coefficient with a printed answer guarded, and one without unguarded', () => {
    const { unguarded, constants, guarded } = guards();
    const free = new Set(unguarded.flatMap(({ method, constants: names }) => names.map((name) => `${method} ${name}`)));
    // W01 prints 1.052 s; the same formula for concrete frames has no printed answer
    expect(free.has('asce7-22/period/steel-moment-frame coefficient')).toBe(false);
    expect(free.has('asce7-22/period/concrete-moment-frame coefficient')).toBe(true);
    expect(free.size).toBe(constants - guarded);
  });
});
