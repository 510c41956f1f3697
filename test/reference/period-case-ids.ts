/** The rows of the period case file: each is run as a reference case, kept as a measured building, or listed here with the reason. */

/** Every id of the file. */
export const PERIOD_CASE_IDS: readonly string[] = [
  ...['W01', 'W03', 'W04', 'W06', 'W08', 'W09', 'W11', 'W13', 'W15', 'W16', 'W18', 'W19', 'W21', 'W23', 'W24', 'W25'],
  ...['W27', 'W28', 'W29', 'W30'],
  ...['D01', 'D03', 'D04', 'D05', 'D07', 'D08', 'D10', 'D11', 'D12'],
  ...['M01', 'M02', 'M03', 'M04', 'M05', 'M06', 'M07', 'M08', 'M09', 'M10'],
  ...['R01', 'R02', 'R03', 'R04', 'R05'],
  ...['P01', 'P02', 'P03', 'P04', 'P05', 'P06'],
];

/** Rows that state no answer of a formula. Those on amplitude are held against the amplitude factors in amplitude.test.ts. */
export const NOT_RUN: Readonly<Record<string, string>> = {
  P01: 'ratios of one building: bounds of the amplitude factors',
  P02: 'ratios of one building: bounds of the amplitude factors',
  P03: 'ratio of one building: bound of the amplitude factors',
  P04: 'ratio of one building: bound of the amplitude factors',
  P05: 'effect of infill and of added walls on ambient periods: no formula takes it',
  P06: 'calculated over empirical periods of models: bounds of the amplitude factor of cracking buildings',
};
