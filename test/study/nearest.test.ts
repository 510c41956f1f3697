import { describe, expect, it } from 'vitest';
import { nearest, nearestFew, suggest } from '../../src/study/nearest.js';

describe('nearest', () => {
  it('finds the word meant: a letter missing, too many, wrong or swapped, any case', () => {
    const known = ['delimiter', 'decimal', 'columns', 'file'];
    expect(['delimeter', 'fiel', 'COLUMN', 'decimals'].map((word) => nearest(word, known))).toEqual([
      'delimiter',
      'file',
      'columns',
      'decimal',
    ]);
  });

  it('finds nothing where nothing is close', () => {
    expect(nearest('spectrum', ['file', 'columns'])).toBeUndefined();
    expect(nearest('', [])).toBeUndefined();
  });
});

describe('nearestFew', () => {
  it('gives the closest first, no more than asked for', () => {
    expect(nearestFew('hote', ['office', 'note', 'hotel', 'motel'], 2)).toEqual(['note', 'hotel']);
    expect(nearestFew('castle', ['hotel', 'parking'], 3)).toEqual([]);
  });
});

describe('suggest', () => {
  it('lists what is known when nothing is close', () => {
    expect(suggest('spectrum', ['file', 'columns'])).toBe('; known: file, columns');
    expect(suggest('flie', ['file', 'columns'])).toBe(' (did you mean "file"?)');
  });
});
