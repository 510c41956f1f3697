import { describe, expect, it } from 'vitest';
import { dayWritten } from '../../src/exports/sheet-date.js';

// The Gregorian calendar: 2024 is a leap year, 2023 and 1900 are not [common knowledge].
describe('dayWritten', () => {
  it.each([
    ...['2026-12-03', '2024-02-29', '2026/1/5', '2026-12-03T09:30:00Z', '2026-12-03 9:30', '3.12.2026', '3. 12. 2026'],
    ...['12/31/2020', '31/12/2020', '31-12-20', '3 Dec 2026', '3-Dec-26', '3. December 2026', 'December 3, 2026'],
  ])('takes %s', (text) => {
    expect(dayWritten(text)).not.toBeNull();
  });

  it.each([
    ...['31/31/2020', '2023-02-29', '29/02/1900', '2026-13-01', '2026-00-10', '0/5/2026', '32.1.2026', '31 Jun 2026'],
    ...['44196', 'yesterday', '3 Foo 2026', '12/2026', '1/2-2026', ''],
  ])('does not take %s', (text) => {
    expect(dayWritten(text)).toBeNull();
  });

  it('says which day, of two that could be meant the earlier', () => {
    for (const text of ['2026-12-03', '3. 12. 2026', '03/12/26', '3 Dec 2026', 'December 3, 2026'])
      expect([Date.UTC(2026, 11, 3), Date.UTC(2026, 2, 12)]).toContain(dayWritten(text));
    expect(dayWritten('3/12/2026')).toBe(Date.UTC(2026, 2, 12));
    expect(dayWritten('13/12/2026')).toBe(Date.UTC(2026, 11, 13));
  });
});
