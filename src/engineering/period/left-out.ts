/** What was looked at and is no record, with the reason. */
export interface LeftOut {
  readonly row: string;
  readonly reason: string;
}

const NOT_SEEN = 'the paper was found, its equation or coefficients were not seen';

export const LEFT_OUT: readonly LeftOut[] = [
  { row: 'EN 1998-1-2, second generation: period', reason: 'no clause on the period was seen; not to be guessed' },
  {
    row: 'NCh 433 (Chile)',
    reason: 'no height formula: the period comes from modal analysis; N/20 is kept as practice',
  },
  { row: 'NTC (Mexico City)', reason: 'no height formula: Rayleigh only' },
  { row: 'RPA 2024 (Algeria)', reason: 'keeps the form C_T h^0.75; its coefficients were not seen' },
  {
    row: 'KDS 41 17 00 (Korea): C_u',
    reason: 'a range of 1.4 to 1.7 without the rows by S_D1',
  },
  { row: 'GB 50009-2012 F.1', reason: 'towers and chimneys, not buildings' },
  {
    row: 'ASCE 7-02, metric column of the table',
    reason:
      'misprinted (0.055 for "other" where 0.0488 is right; 0.044, 0.068, 0.07 recalled): the foot values are held',
  },
  {
    row: 'ASCE 7-16 and 7-22, metric C_q 0.00058',
    reason: 'inconsistent with heights in metres, 10.8 times too short: 0.0019 ft is held',
  },
  {
    row: 'NBC (Canada) 4.1.8.11 (3)(d)(v): periods for drift',
    reason: 'a rule about which cap applies, without a number of its own',
  },
  { row: 'Oliveira and Navarro 2010, Portugal', reason: NOT_SEEN },
  { row: 'Chun, Lee et al. 2000, Korean wall apartments', reason: NOT_SEEN },
  { row: 'Hafeez et al., Canadian light wood frame', reason: NOT_SEEN },
  {
    row: 'Hatzigeorgiou and Kanapitsas 2013',
    reason: 'only the form H^0.745 with terms for walls, infill and soil is recalled, no coefficients',
  },
  {
    row: 'Unreinforced and confined masonry',
    reason: 'no regression with coefficients was seen; the codes’ "other" formulas stand in',
  },
  {
    row: 'Kwon and Kim 2010, essential buildings',
    reason: 'about 40 % shorter: a remark without a formula, kept as a known bias',
  },
  {
    row: 'Spread of published laws (upper over lower bound, FOSM, infill effect)',
    reason: 'spreads, not periods: they stand behind the method errors of the settings',
  },
  {
    row: 'Period in strong shaking over small amplitude',
    reason: 'ratios of single buildings: they stand behind the two amplitude factors, 1.3 and 1.5',
  },
  {
    row: 'Goel and Chopra, tables of measured buildings',
    reason: 'the tables were not seen, only the laws fitted to them',
  },
];
