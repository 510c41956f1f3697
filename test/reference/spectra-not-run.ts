/** The check values of the data sheet of spectra, by id: each has a reference case, or a reason why it has none. */

/** Ids of the sheet, copied. */
export const SPECTRA_IDS: readonly string[] = [
  ...['01', '03', '04', '06', '07', '09', '10', '12', '13', '15', '16', '18', '19', '21', '22', '24', '25', '27', '28'],
  ...['30', '31', '33', '34', '36', '37', '39', '40', '41', '42', '43', '44', '45', '46', '47', '48', '49', '50', '51'],
  ...['52', '53', '54', '55', '56', '57', '58', '59', '60', '61'],
].map((number) => `SP-${number}`);

/** Why a row is not run. */
export const NOT_RUN: Readonly<Record<string, string>> = {
  'SP-10':
    'corner periods, no record yields them: checked on the compiled spectrum in test/engineering/spectrum/compiled.test.ts',
  'SP-18': 'the row states no answer: the printed ones lie past the stored part of its page',
};
