/** Dates as people write them into a sheet. */

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/**
 * The day of the calendar that `text` names, as its beginning in UTC, ms: 2026-12-03, 3.12.2026, 12/3/26, 3 Dec 2026; a time may follow. Of two
 * days that could be meant the earlier; null where it names none.
 */
export function dayWritten(text: string): number | null {
  const day = text
    .trim()
    .replace(/[T ,]+\d{1,2}:\d{2}\S*(?: ?[ap]m)?$/i, '')
    .toLowerCase();
  const iso = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/.exec(day);
  if (iso !== null) return dayOf(iso[1], iso[2], iso[3]);
  const numbers = /^(\d{1,2})([-/.]) ?(\d{1,2})\2 ?(\d{4}|\d{2})$/.exec(day);
  // Which of the two is the day depends on the country.
  if (numbers !== null)
    return earlier(dayOf(numbers[4], numbers[3], numbers[1]), dayOf(numbers[4], numbers[1], numbers[3]));
  const named = /^(\d{1,2})[-. ]+([a-z]{3})[a-z]*[-., ]+(\d{4}|\d{2})$/.exec(day);
  if (named !== null) return dayOf(named[3], monthOf(named[2]), named[1]);
  const american = /^([a-z]{3})[a-z]*\.? +(\d{1,2}),? +(\d{4})$/.exec(day);
  return american === null ? null : dayOf(american[3], monthOf(american[1]), american[2]);
}

function monthOf(name: string | undefined): string {
  return String(MONTHS.indexOf(name ?? '') + 1);
}

function earlier(a: number | null, b: number | null): number | null {
  return a === null || b === null ? (a ?? b) : Math.min(a, b);
}

function dayOf(year: string | undefined, month: string | undefined, day: string | undefined): number | null {
  const [y, m, d] = [Number(year), Number(month), Number(day)];
  const whole = y < 100 ? 2000 + y : y;
  // the day before the first of the next month is the last of this
  const last = new Date(Date.UTC(whole, m, 0)).getUTCDate();
  return m >= 1 && m <= 12 && d >= 1 && d <= last ? Date.UTC(whole, m - 1, d) : null;
}
