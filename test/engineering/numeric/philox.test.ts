import { describe, expect, it } from 'vitest';
import { hashText, philox } from '../../../src/engineering/numeric/philox.js';

const ALL = 0xffffffff;
type Four = readonly [number, number, number, number];
type Known = readonly [counter: Four, key: readonly [number, number], answer: Four];
const KNOWN: readonly Known[] = [
  [
    [0, 0, 0, 0],
    [0, 0],
    [0x6627e8d5, 0xe169c58d, 0xbc57ac4c, 0x9b00dbd8],
  ],
  [
    [ALL, ALL, ALL, ALL],
    [ALL, ALL],
    [0x408f276d, 0x41c83b0e, 0xa20bc7c6, 0x6d5451fd],
  ],
  [
    [0x243f6a88, 0x85a308d3, 0x13198a2e, 0x03707344],
    [0xa4093822, 0x299f31d0],
    [0xd16cfe09, 0x94fdcceb, 0x5001e420, 0x24126ea1],
  ],
];

describe('philox', () => {
  // known answers of the authors' distribution (Random123, kat_vectors, philox4x32 of 10 rounds), from memory
  it.each(KNOWN)('gives the known answer for counter %j and key %j', (counter, key, answer) => {
    const out = new Uint32Array(4);
    philox(...counter, ...key, out);
    expect([...out]).toEqual([...answer]);
  });

  it('spreads its words evenly', () => {
    const out = new Uint32Array(4);
    let sum = 0;
    const n = 20_000;
    for (let i = 0; i < n; i += 1) {
      philox(i, 0, 7, 0, 1, 2, out);
      for (const word of out) sum += word / 4294967296;
    }
    // four standard errors of the mean of 4n uniform numbers
    expect(Math.abs(sum / (4 * n) - 0.5)).toBeLessThan(4 / Math.sqrt(12 * 4 * n));
  });
});

describe('hashText', () => {
  it('tells ids apart and gives the same number again', () => {
    const hashes = Array.from({ length: 2000 }, (_, i) => hashText(`B-${String(i)}`));
    expect(new Set(hashes).size).toBe(2000);
    expect(hashText('B-7')).toBe(hashes[7]);
  });
});
