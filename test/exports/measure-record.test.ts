import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { UserError, formatError } from '../../src/errors.js';
import { inventoryLines, measureFile } from '../../src/exports/measure-record.js';
import type { MeasureRequest, MeasuredRecord } from '../../src/exports/measure-record.js';
import { scratch } from '../support/cli.js';
import { ambientOf, decayOf, noiseOf, sumOf } from '../support/engineering-vibration.js';

const { folder, remove } = scratch();
afterAll(remove);
let files = 0;
const write = (text: string | Buffer, name = `record-${String((files += 1))}.csv`): string => {
  const path = join(folder, name);
  writeFileSync(path, text);
  return path;
};
const read = (text: string | Buffer, request: MeasureRequest = {}): Promise<MeasuredRecord> =>
  measureFile(write(text), request);
const complaint = async (text: string | Buffer, request: MeasureRequest = {}): Promise<string> => {
  try {
    await read(text, request);
  } catch (error) {
    expect(error).toBeInstanceOf(UserError);
    return formatError(error).replace(folder, '');
  }
  throw new Error('no complaint');
};

// 2 Hz, 100 samples a second
const RATE = 100;
const values = ambientOf({ frequency_hz: 2, damping: 0.02 }, RATE, 12_000, 1);
const rows = (line: (t: number, v: number, i: number) => string): string[] =>
  [...values].map((v, i) => line(i / RATE, v, i));
const comma = (text: string): string => text.replaceAll('.', ',');
const expected = await read(['time,acc', ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`)].join('\n'));

describe('measureFile', () => {
  it('reads the record that was written', () => {
    expect(expected.record.signal.rate_hz).toBeCloseTo(RATE, 9);
    expect(expected.record.signal.values).toHaveLength(12_000);
    expect(expected.record.signal.values[7]).toBe(Number(values[7]!.toFixed(6)));
    expect(Math.abs(expected.measured.frequency_hz - 2)).toBeLessThan(0.03);
    expect(expected.record.notes).toEqual([]);
  });

  it.each<[string, string | Buffer, MeasureRequest]>([
    [
      'semicolons and decimal commas',
      ['Zeit;Beschl. [m/s²]', ...rows((t, v) => comma(`${t.toFixed(2)};${v.toFixed(6)}`))].join('\r\n'),
      {},
    ],
    ['tabs', ['t\tv', ...rows((t, v) => `${t.toFixed(2)}\t${v.toFixed(6)}`)].join('\n'), {}],
    ['blanks, no header', rows((t, v) => `  ${t.toFixed(2)}   ${v.toFixed(6)}`).join('\n'), {}],
    ['no header', rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`).join('\n'), {}],
    [
      'a preamble and comments',
      [
        '# station 4, roof',
        'Recorder 7',
        '# time (s), acc (g)',
        ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`),
      ].join('\n'),
      {},
    ],
    ['a line of units', ['time,acc', 's,mg', ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`)].join('\n'), {}],
    [
      'milliseconds',
      ['time_ms,acc', ...rows((t, v) => `${String(Math.round(t * 1000))},${v.toFixed(6)}`)].join('\n'),
      {},
    ],
    [
      'clock times',
      [
        'at,acc',
        ...rows((t, v) => `10:0${String(Math.floor(t / 60))}:${(t % 60).toFixed(2).padStart(5, '0')},${v.toFixed(6)}`),
      ].join('\n'),
      { time: 'at' },
    ],
    [
      'timestamps',
      [
        'timestamp,acc',
        ...rows((t, v) => `${new Date(1e12 + Math.round(t * 1000)).toISOString()},${v.toFixed(6)}`),
      ].join('\n'),
      {},
    ],
    ['one column and a rate', rows((_, v) => v.toFixed(6)).join('\n'), { rate_hz: RATE }],
    ['one column of decimal commas', ['acc', ...rows((_, v) => comma(v.toFixed(6)))].join('\n'), { rate_hz: RATE }],
    [
      'a counter and a rate',
      ['n,acc', ...rows((_, v, i) => `${String(i)},${v.toFixed(6)}`)].join('\n'),
      { rate_hz: RATE },
    ],
    ['quotes', ['"time","acc, x"', ...rows((t, v) => `"${t.toFixed(2)}","${v.toFixed(6)}"`)].join('\n'), {}],
    [
      'UTF-16',
      Buffer.from(`\ufeff${['time,acc', ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`)].join('\n')}`, 'utf16le'),
      {},
    ],
    ['old line ends', ['time,acc', ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`)].join('\r'), {}],
    [
      'channels to choose from',
      ['t,a,b', ...rows((t, v, i) => `${t.toFixed(2)},${String(i % 7)},${v.toFixed(6)}`)].join('\n'),
      { channel: 'b' },
    ],
    [
      'a channel by number',
      ['t,a,b', ...rows((t, v, i) => `${t.toFixed(2)},${String(i % 7)},${v.toFixed(6)}`)].join('\n'),
      { channel: '3' },
    ],
    [
      'exponents',
      ['t,a', ...rows((t, v) => `${t.toExponential(6)},${Number(v.toFixed(6)).toExponential(12)}`)].join('\n'),
      {},
    ],
  ])('reads %s alike', async (_name, text, request) => {
    const { record, measured } = await read(text, request);
    expect(record.signal.rate_hz).toBeCloseTo(RATE, 6);
    expect(record.signal.values.every((value, i) => value === expected.record.signal.values[i])).toBe(true);
    expect(record.signal.gaps).toEqual([]);
    expect(measured.frequency_hz).toBeCloseTo(expected.measured.frequency_hz, 9);
  });

  it('names the channel, its unit and the others', async () => {
    const { record } = await read(
      ['t,acc x (m/s²),vel_mm_per_s', ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)},1`)].join('\n'),
    );
    expect(record.channel).toEqual({ number: 2, name: 'acc x', unit: 'm/s²' });
    expect(record.channels[1]).toEqual({ number: 3, name: 'vel_mm_per_s', unit: 'mm/s' });
  });

  it('takes the rate from the mean step where the digits are coarse, and finds the gap', async () => {
    const lines = rows((_, v, i) => `${(i / 256).toFixed(3)},${v.toFixed(6)}`);
    lines.splice(6000, 512);
    const { record } = await read(['t,a', ...lines].join('\n'));
    expect(record.signal.rate_hz).toBeCloseTo(256, 1);
    expect(record.signal.gaps).toHaveLength(1);
    expect(record.signal.gaps[0]!.at).toBe(6000);
    expect(record.signal.gaps[0]!.missing_s).toBeCloseTo(2, 2);
  });

  it('cuts out what it cannot read and says where', async () => {
    const lines = rows((t, v, i) => `${t.toFixed(2)},${i === 500 ? 'overload' : i === 800 ? '' : v.toFixed(6)}`);
    const { record, measured } = await read(['t,a', ...lines].join('\n'));
    expect(record.notes).toEqual([
      'line 502: "overload" is not a number; 1 row like this cut out',
      '1 sample is blank or marked as missing',
    ]);
    expect(measured.cuts.unreadable).toBe(2);
  });

  it('takes a part', async () => {
    const { record } = await read(['t,a', ...rows((t, v) => `${(t + 5).toFixed(2)},${v.toFixed(6)}`)].join('\n'), {
      from_s: 10,
      to_s: 70,
    });
    expect(record.signal.values[0]).toBe(Number(values[1000]!.toFixed(6)));
    expect(record.signal.values).toHaveLength(6001);
    expect(record.signal.gaps).toEqual([]);
  });

  it.each<[string, string, MeasureRequest, string]>([
    [
      'goes backwards',
      ['t,a', ...rows((t, v, i) => `${(i === 700 ? t - 3 : t).toFixed(2)},${v.toFixed(4)}`)].join('\n'),
      {},
      '.csv:702 column t: time goes backwards, from 6.99 to 4 s',
    ],
    [
      'has too few digits',
      ['t,a', ...rows((t, v) => `${t.toFixed(1)},${v.toFixed(4)}`)].join('\n'),
      {},
      'the column has too few digits',
    ],
    [
      'is missing',
      rows((_, v) => v.toFixed(4)).join('\n'),
      {},
      'the file has one column, so that the sampling rate is not known; give it with --rate-hz',
    ],
    [
      'only counts',
      ['n,a', ...rows((_, v, i) => `${String(i)},${v.toFixed(4)}`)].join('\n'),
      {},
      'column n only counts the samples',
    ],
    [
      'is asked for and not there',
      't,a\n0,1\n1,2\n',
      { time: 'clock' },
      '--time "clock": there is no such column; the columns are 1 t, 2 a',
    ],
  ])('refuses a time column that %s', async (_name, text, request, message) => {
    expect(await complaint(text, request)).toContain(message);
  });

  it('refuses what is no record', async () => {
    expect(await complaint('')).toContain('the file is empty');
    expect(await complaint('name,city\nA,B\n')).toContain('no rows of numbers in the first 2 lines');
    expect(await complaint('t,a\n0,1\n1,2\n')).toContain('the record is too short');
    const bad = rows((t, v, i) => `${t.toFixed(2)},${i < 300 || i % 3 === 0 ? v.toFixed(4) : 'x'}`);
    expect(await complaint(['t,a', ...bad].join('\n'))).toContain(
      'column a: 7800 of 12000 samples cannot be read; choose another with --channel',
    );
    expect(await complaint('t,a\n0,1\n1,2\n', { from_s: 10 })).toContain('no samples between --from-s and --to-s');
  });

  it('draws the spectrum: axes with titles, a title and a description, nothing of a hostile name left as markup', async () => {
    const decay = sumOf(decayOf({ frequency_hz: 2, damping: 0.02 }, RATE, 2500, 2), noiseOf(2500, 1, 0.01));
    const path = write(`t,<b>&"x\n${[...decay].map((v, i) => `${(i / RATE).toFixed(2)},${v.toFixed(6)}`).join('\n')}`);
    const target = join(folder, 'new folder', 'decay.svg');
    const { svg } = await measureFile(path, { svg: target });
    expect(svg).toBe(target);
    const text = readFileSync(target, 'utf8');
    for (const words of [
      'Frequency (Hz)',
      'Amplitude density (unit/√Hz)',
      'Time (s)',
      '<title>',
      '<desc>Spectrum from',
      'The free decay:',
    ])
      expect(text).toContain(words);
    expect(text).not.toContain('<b>');
    expect(text).toContain('&lt;b&gt;');
    expect(readdirSync(join(folder, 'new folder'))).toEqual(['decay.svg']);
    await measureFile(path, { svg: join(folder, 'again.svg') });
    expect(readFileSync(join(folder, 'again.svg'), 'utf8')).toBe(text);
  });

  it('says which option to change where the picture cannot be written, and leaves nothing', async () => {
    mkdirSync(join(folder, 'taken', 'roof.svg'), { recursive: true });
    const path = write(['time,acc', ...rows((t, v) => `${t.toFixed(2)},${v.toFixed(6)}`)].join('\n'));
    writeFileSync(join(folder, 'file'), '');
    await expect(measureFile(path, { svg: join(folder, 'file', 'roof.svg') })).rejects.toThrow('--svg');
    expect(existsSync(join(folder, 'file', 'roof.svg'))).toBe(false);
  });
});

describe('inventoryLines', () => {
  it('writes the columns of the inventory, and a hostile id as a spreadsheet may hold it', () => {
    expect(inventoryLines(expected.measured, 'transverse', 'BH "1", old')).toEqual([
      'id,measured_period_transverse_s,measured_amplitude',
      `"BH ""1"", old",${String(Number(expected.measured.period_s.toPrecision(4)))},ambient`,
    ]);
    expect(inventoryLines({ ...expected.measured, kind: 'decay' }, 'longitudinal', '=1')[1]).toMatch(/^'=1,.*,forced$/);
  });
});
