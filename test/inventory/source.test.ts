import { describe, expect, it } from 'vitest';
import { UserError } from '../../src/errors.js';
import { inspectSource, readUtf8 } from '../../src/inventory/source.js';
import { writeTable } from '../support/inventory-intake.js';

function read(content: Buffer, encoding = 'auto'): { encoding: string; text: string } {
  const source = inspectSource(writeTable(content), encoding);
  return {
    encoding: source.encoding,
    text: Buffer.concat([...readUtf8(source)].map((part) => Buffer.from(part))).toString('utf8'),
  };
}

const TEXT = 'id,name\n1,Café – naïve „x“\n';

describe('inspectSource', () => {
  it('tells UTF-8 with and without a byte order mark', () => {
    expect(read(Buffer.from(TEXT))).toEqual({ encoding: 'utf-8', text: TEXT });
    expect(read(Buffer.from(`\ufeff${TEXT}`))).toEqual({ encoding: 'utf-8', text: TEXT });
  });

  it('takes what is not UTF-8 as Windows-1252, and latin-1 too', () => {
    // 0x96 is an en dash in Windows-1252 (WHATWG Encoding Standard, index windows-1252) and a control character in Latin-1.
    const bytes = Buffer.from([0x69, 0x64, 0x0a, 0x43, 0x61, 0x66, 0xe9, 0x20, 0x96, 0x0a]);
    expect(read(bytes)).toEqual({ encoding: 'windows-1252', text: 'id\nCafé –\n' });
    expect(read(bytes, 'latin-1').encoding).toBe('windows-1252');
  });

  it('reads UTF-16 of both byte orders, marked or not', () => {
    const little = Buffer.from(TEXT, 'utf16le');
    const big = Buffer.from(little).swap16();
    expect(read(Buffer.concat([Buffer.from([0xff, 0xfe]), little]))).toEqual({ encoding: 'utf-16le', text: TEXT });
    expect(read(Buffer.concat([Buffer.from([0xfe, 0xff]), big]))).toEqual({ encoding: 'utf-16be', text: TEXT });
    expect(read(little)).toEqual({ encoding: 'utf-16le', text: TEXT });
    expect(read(big)).toEqual({ encoding: 'utf-16be', text: TEXT });
  });

  it('finds a wrong byte at the far end of a file, and a character cut by the edge of a chunk', () => {
    const long = 'é'.repeat(2_200_000);
    expect(read(Buffer.from(`a${long}`)).encoding).toBe('utf-8');
    expect(read(Buffer.concat([Buffer.from(`a${long}`), Buffer.from([0xe9])])).encoding).toBe('windows-1252');
    expect(read(Buffer.from(`a${long}`)).text.length).toBe(2_200_001);
  });

  it('refuses what it cannot read, saying what to do', () => {
    expect(() => inspectSource('/nowhere/x.csv', 'auto')).toThrow(/no such file/);
    expect(() => inspectSource(writeTable(''), 'auto')).toThrow(/empty/);
    expect(() => inspectSource(writeTable(Buffer.from('PK\u0003\u0004zip')), 'auto')).toThrow(/save it as CSV/);
    expect(() => inspectSource(writeTable(Buffer.from([0x69, 0xe9, 0x0a])), 'utf-8')).toThrow(/windows-1252/);
    expect(() => inspectSource('/', 'auto')).toThrow(UserError);
  });

  it('hashes the bytes of the file', () => {
    // SHA-256 of "abc": FIPS 180-2, appendix B.1.
    expect(inspectSource(writeTable('abc'), 'auto').hash.digest('hex')).toBe(
      'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
    );
  });
});
