import { PassThrough } from 'node:stream';
import { describe, expect, it } from 'vitest';
import { askYes } from '../../src/cli/ask.js';

describe('askYes', () => {
  it.each([
    ['y\n', true],
    ['Yes\n', true],
    ['\n', false],
    ['no\n', false],
    ['', false],
  ])('takes %j for %s', async (typed, answer) => {
    const input = new PassThrough();
    const output = new PassThrough();
    input.end(typed);
    expect(await askYes('Delete run 1?', input, output)).toBe(answer);
    expect(String(output.read())).toContain('Delete run 1? [y/N]');
  });
});
