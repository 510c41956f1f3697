/**
 * Philox4x32-10, a counter-based random generator (Salmon, Moraes, Dror and Shaw, "Parallel random numbers: as easy as 1, 2, 3",
 * 2011): the same key and counter give the same number in any order on any thread.
 */
const M0 = 0xd2511f53;
const M1 = 0xcd9e8d57;
const W0 = 0x9e3779b9;
const W1 = 0xbb67ae85;

function highWord(a: number, b: number): number {
  const a0 = a & 0xffff;
  const a1 = a >>> 16;
  const b0 = b & 0xffff;
  const b1 = b >>> 16;
  const middle = a1 * b0 + ((a0 * b0) >>> 16);
  const lower = (middle & 0xffff) + a0 * b1;
  return (a1 * b1 + Math.floor(middle / 65536) + Math.floor(lower / 65536)) >>> 0;
}

/** Four 32-bit words for a 128-bit counter and a 64-bit key, written to `out`. */
export function philox(c0: number, c1: number, c2: number, c3: number, k0: number, k1: number, out: Uint32Array): void {
  let [x0, x1, x2, x3] = [c0 >>> 0, c1 >>> 0, c2 >>> 0, c3 >>> 0];
  let [a, b] = [k0 >>> 0, k1 >>> 0];
  for (let round = 0; round < 10; round += 1) {
    const h0 = highWord(M0, x0);
    const l0 = Math.imul(M0, x0) >>> 0;
    const h1 = highWord(M1, x2);
    const l1 = Math.imul(M1, x2) >>> 0;
    [x0, x1, x2, x3] = [(h1 ^ x1 ^ a) >>> 0, l1, (h0 ^ x3 ^ b) >>> 0, l0];
    a = (a + W0) >>> 0;
    b = (b + W1) >>> 0;
  }
  out[0] = x0;
  out[1] = x1;
  out[2] = x2;
  out[3] = x3;
}

/** A 32-bit FNV-1a hash of a text, to key draws by a building's id rather than by its row. */
export function hashText(text: string): number {
  let hash = 0x811c9dc5;
  for (let i = 0; i < text.length; i += 1) {
    hash = Math.imul(hash ^ (text.charCodeAt(i) & 0xff), 0x01000193);
    hash = Math.imul(hash ^ (text.charCodeAt(i) >>> 8), 0x01000193);
  }
  return hash >>> 0;
}
