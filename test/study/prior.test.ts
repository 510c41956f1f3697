import { describe, expect, it } from 'vitest';
import { SYSTEMS } from '../../src/engineering/building.js';
import { UserError, formatError } from '../../src/errors.js';
import { loadPrior, priorFromText } from '../../src/study/prior.js';

const SYSTEM_LIST = SYSTEMS.join(', ');
const HEADER = 'use,storeys_from,storeys_to,built_from,built_to,system,chance\n';

function complaints(text: string): string[] {
  try {
    priorFromText(text);
  } catch (error) {
    if (error instanceof UserError) return formatError(error).split('\n');
    throw error;
  }
  return [];
}

describe('priorFromText', () => {
  it('groups rows whose first five cells are alike, in the order of the file', () => {
    const table = `${HEADER}office,1,3,,1949,unreinforced-masonry-wall,0.7
,,,1950,,concrete-moment-frame,0.25

office,1,3,,1949,timber-light-frame,0.3
,,,1950,,steel-moment-frame,0.75
`;
    expect(priorFromText(`\ufeff${table.replaceAll('\n', '\r\n')}`)).toEqual(priorFromText(table));
    for (const mark of [';', '\t']) expect(priorFromText(table.replaceAll(',', mark))).toEqual(priorFromText(table));
    expect(priorFromText(table)).toEqual([
      {
        use: 'office',
        storeysFrom: 1,
        storeysTo: 3,
        builtFrom: null,
        builtTo: 1949,
        label: 'office, 1 to 3 storeys, built up to 1949',
        chances: [
          { system: 'unreinforced-masonry-wall', chance: 0.7 },
          { system: 'timber-light-frame', chance: 0.3 },
        ],
      },
      {
        use: null,
        storeysFrom: null,
        storeysTo: null,
        builtFrom: 1950,
        builtTo: null,
        label: 'any use, any number of storeys, built from 1950',
        chances: [
          { system: 'concrete-moment-frame', chance: 0.25 },
          { system: 'steel-moment-frame', chance: 0.75 },
        ],
      },
    ]);
  });

  it('reports every problem at once, by row', () => {
    const rows = [
      'ofice,1,3,,1949,steel-moment-frame,1',
      'office,3,1,,,steel-moment-frame,1',
      'office,1.5,,later,,steel-moment-frame,1',
      'hotel,,,,,steel-lightframe,0.5',
      'hotel,,,,,timber-light-frame,1.5',
      'hotel,,,,,unknown,',
      'retail,,,,,timber-light-frame',
    ];
    expect(complaints(HEADER + rows.join('\n'))).toEqual([
      'system-prior.csv row 2, column use: unknown word "ofice" (did you mean "office"?)',
      'system-prior.csv row 3, column storeys_to: expected at least 3, got "1"',
      'system-prior.csv row 4, column storeys_from: expected a whole number 0 to 200 or blank for any, got "1.5"',
      'system-prior.csv row 4, column built_from: expected a whole number 0 to 2200 or blank for any, got "later"',
      'system-prior.csv row 5, column system: unknown word "steel-lightframe" (did you mean "steel-light-frame"?)',
      'system-prior.csv row 6, column chance: expected a number > 0 and <= 1, got "1.5"',
      `system-prior.csv row 7, column system: unknown word "unknown"; known: ${SYSTEM_LIST}`,
      'system-prior.csv row 7, column chance: expected a number > 0 and <= 1, got ""',
      'system-prior.csv row 8: expected 7 cells, got 6',
    ]);
  });

  it('refuses chances that do not sum to 1, a system twice in a group, and a group that never applies', () => {
    const rows = [
      'office,,,,,steel-moment-frame,0.5',
      'office,,,,,timber-light-frame,0.49',
      'hotel,,,,,timber-light-frame,0.5',
      'hotel,,,,,timber-light-frame,0.5',
      'office,1,3,1950,1960,timber-light-frame,1',
    ];
    expect(complaints(HEADER + rows.join('\n'))).toEqual([
      'system-prior.csv row 2, column chance: the chances of "office, any number of storeys, any year" sum to 0.99, not 1 (rows 2, 3)',
      'system-prior.csv row 5, column system: timber-light-frame stands in row 4 of the same group already; keep one',
      'system-prior.csv row 6: "office, 1 to 3 storeys, built 1950 to 1960" never applies: "office, any number of storeys, any year" of row 2 comes first and covers it; move it above',
    ]);
  });

  it('takes a sum within a millionth of 1', () => {
    expect(complaints(`${HEADER},,,,,steel-moment-frame,0.333333\n,,,,,timber-light-frame,0.666667\n`)).toEqual([]);
    expect(complaints(`${HEADER},,,,,steel-moment-frame,0.33333\n,,,,,timber-light-frame,0.66666\n`)).toHaveLength(1);
  });

  it('refuses a file that is not such a table', () => {
    expect(complaints('use;system\n')).toEqual([
      'system-prior.csv row 1: expected the columns use,storeys_from,storeys_to,built_from,built_to,system,chance; got "use,system"',
    ]);
    expect(complaints(HEADER)).toEqual(['system-prior.csv: no rows below the header']);
    expect(complaints(`${HEADER}"office,1`)[0]).toMatch(
      /^system-prior\.csv: not a table with commas, semicolons or tabs: /,
    );
  });
});

describe('loadPrior', () => {
  it('reads the demo table', async () => {
    const groups = await loadPrior('data-demo/system-prior.csv');
    for (const { chances } of groups) expect(chances.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 6);
    expect(groups.length).toBeGreaterThan(0);
  });

  it('names the file that is not there', async () => {
    await expect(loadPrior('none/system-prior.csv')).rejects.toThrow('no such file');
  });
});
