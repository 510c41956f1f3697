// The form of a message and the exit codes are the project's own design (judgement); 70 is EX_SOFTWARE of BSD sysexits.h.
import { describe, expect, it } from 'vitest';
import { Bug, EXIT, UserError, exitCodeOf, formatError, showValue } from '../src/errors.js';

describe('formatError', () => {
  it('puts file, line, column and key before the message', () => {
    const place = { file: 'study.yaml', line: 14, column: 9, key: 'hazard.spectra.design.code' };
    expect(formatError(new UserError('unknown code "asce7-21"; known: asce7-16, asce7-22', place))).toBe(
      'study.yaml:14:9 hazard.spectra.design.code: unknown code "asce7-21"; known: asce7-16, asce7-22',
    );
  });

  it('names the row and the column of a table', () => {
    const place = { file: 'inventory.csv', row: 12, columnName: 'height_m' };
    expect(formatError(new UserError('"tall" is no number', place))).toBe(
      'inventory.csv row 12, column height_m: "tall" is no number',
    );
  });

  it.each([
    [{}, 'wrong'],
    [{ file: 'a.csv' }, 'a.csv: wrong'],
    [{ file: 'a.yaml', line: 3 }, 'a.yaml:3: wrong'],
    [{ key: 'list.size' }, 'list.size: wrong'],
    [{ row: 4 }, 'row 4: wrong'],
    [{ columnName: 'id' }, 'column id: wrong'],
    [{ file: 'a.yaml', column: 5 }, 'a.yaml: wrong'],
  ])('leaves out what the place %j does not say', (place, line) => {
    expect(formatError(new UserError('wrong', place))).toBe(line);
  });

  it('gives one line per problem, in order', () => {
    const error = UserError.of([
      { place: { key: 'a' }, message: 'first' },
      { place: { key: 'b' }, message: 'second\nstill second' },
    ]);
    expect(formatError(error)).toBe('a: first\nb: second still second');
  });

  it('removes control characters and reading-order marks from place and message', () => {
    const error = new UserError('\u001b[31mred\u0007 \u202etxt', { file: 'a\u001bb\r\nc' });
    expect(formatError(error)).toBe('ab c: [31mred txt');
  });

  it('calls anything unforeseen a bug, on one line', () => {
    expect(formatError(new Bug('no\nway'))).toMatch(/^a bug in swaymark: no way; .+$/);
    expect(formatError(new TypeError('x is undefined'))).toContain('x is undefined');
    expect(formatError('thrown text')).toContain('"thrown text"');
  });
});

describe('UserError', () => {
  it('keeps the message free of the place', () => {
    const error = new UserError('wrong', { file: 'a.csv' });
    expect(error.message).toBe('wrong');
    expect(error.place).toEqual({ file: 'a.csv' });
    expect(error.problems).toEqual([{ place: { file: 'a.csv' }, message: 'wrong' }]);
  });

  it('keeps the error underneath as its cause', () => {
    const cause = new Error('underneath');
    expect(new UserError('wrong', {}, { cause }).cause).toBe(cause);
    expect('cause' in new UserError('wrong')).toBe(false);
  });

  it('counts the problems when there are several', () => {
    const problem = { place: { key: 'a' }, message: 'first' };
    expect(UserError.of([problem]).message).toBe('first');
    expect(UserError.of([problem, problem]).message).toBe('2 problems, the first: first');
    expect(() => UserError.of([])).toThrow(Bug);
  });
});

describe('exitCodeOf', () => {
  it('gives 2 to the user and 70 to us', () => {
    expect(exitCodeOf(new UserError('wrong'))).toBe(2);
    expect(exitCodeOf(new Bug('wrong'))).toBe(70);
    expect(exitCodeOf(new RangeError('wrong'))).toBe(70);
    expect(EXIT).toEqual({ clean: 0, findings: 1, user: 2, bug: 70 });
  });
});

describe('showValue', () => {
  it.each([
    ['plain', '"plain"'],
    ['a"b\nc\u001b', '"a\\"b\\nc\\u001b"'],
    [Infinity, 'Infinity'],
    [1.5, '1.5'],
    [null, 'null'],
    [undefined, 'undefined'],
    [{ a: [1] }, '{"a":[1]}'],
    [() => 1, 'function'],
  ])('shows %j', (value, shown) => {
    expect(showValue(value)).toBe(shown);
  });

  it('names the kind of what has no text', () => {
    expect(showValue(7n)).toBe('7');
    expect(showValue({ a: 1n })).toBe('an object');
    expect(showValue([1n])).toBe('a list');
  });

  it('cuts at 200 characters without halving one', () => {
    expect(showValue('x'.repeat(200))).toBe(`"${'x'.repeat(200)}"`);
    expect(showValue('x'.repeat(201))).toBe(`"${'x'.repeat(200)}…"`);
    expect(showValue('🏠'.repeat(200))).toBe(`"${'🏠'.repeat(200)}"`);
    expect(showValue('🏠'.repeat(201))).toBe(`"${'🏠'.repeat(200)}…"`);
  });
});
