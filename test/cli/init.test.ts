import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildCommand, copyDemo, scratch, swaymark } from '../support/cli.js';

const place = scratch();

beforeAll(() => {
  buildCommand();
  copyDemo(place.folder);
}, 120_000);
afterAll(() => {
  place.remove();
});

describe('swaymark init', () => {
  it('proposes a study beside the table, marks the open questions and says what to do next', () => {
    const { code, out, err } = swaymark(['init', 'inventory.csv', '--output', 'proposed.yaml'], { cwd: place.folder });
    expect([code, err]).toEqual([0, '']);
    expect(out).toMatch(/^height_m +Height \(m\) +m$/m);
    expect(out).toContain('then run swaymark check');
    const text = readFileSync(join(place.folder, 'proposed.yaml'), 'utf8');
    expect(text).toContain('QUESTION');
    expect(text).toContain('file: "inventory.csv"');
  });

  it('names the table as the study will find it when the study stands elsewhere', () => {
    mkdirSync(join(place.folder, 'sub'));
    expect(swaymark(['init', 'inventory.csv', '--output', 'sub/study.yaml'], { cwd: place.folder }).code).toBe(0);
    expect(readFileSync(join(place.folder, 'sub/study.yaml'), 'utf8')).toContain('file: "../inventory.csv"');
  });

  it('never replaces a file', () => {
    writeFileSync(join(place.folder, 'mine.yaml'), 'mine');
    const { code, err } = swaymark(['init', 'inventory.csv', '--output', 'mine.yaml'], { cwd: place.folder });
    expect([code, err]).toEqual([
      2,
      'mine.yaml: this file exists already and is not replaced; name another with --output\n',
    ]);
    expect(readFileSync(join(place.folder, 'mine.yaml'), 'utf8')).toBe('mine');
  });

  it('says so when there is no such table or folder', () => {
    expect(swaymark(['init', 'nope.csv', '--output', 'x.yaml'], { cwd: place.folder })).toMatchObject({
      code: 2,
      err: expect.stringContaining('nope.csv') as string,
    });
    expect(swaymark(['init', 'inventory.csv', '--output', 'no/such/x.yaml'], { cwd: place.folder })).toMatchObject({
      code: 2,
      err: expect.stringContaining('no such folder') as string,
    });
  });
});
