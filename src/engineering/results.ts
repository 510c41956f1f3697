/** The columns an assessment and the ranking yield, in order: one spelling in database, exports and page. */
export interface ResultColumn {
  readonly name: string;
  readonly kind: 'number' | 'whole' | 'text';
  readonly title: string;
  /** Unit id; absent for pure numbers and words. */
  readonly unit?: string;
  readonly meaning: string;
}

const column = (
  name: string,
  kind: ResultColumn['kind'],
  title: string,
  meaning: string,
  unit?: string,
): ResultColumn => (unit === undefined ? { name, kind, title, meaning } : { name, kind, title, meaning, unit });

export const RESULT_COLUMNS: readonly ResultColumn[] = [
  column('rank', 'whole', 'Rank', 'place by median priority; blank when not ranked'),
  column('in_list', 'text', 'In the list', 'yes: among the first list_size'),
  column('chance', 'number', 'Chance of belonging', 'chance that the building truly belongs to the list'),
  column('rank_best', 'whole', 'Best rank', 'rank at the 95th percentile of its priority'),
  column('rank_worst', 'whole', 'Worst rank', 'rank at the 5th percentile of its priority'),
  column('tie_group', 'whole', 'Tie group', 'buildings of one group cannot be told apart'),
  column('priority', 'number', 'Priority', 'relative annual exposure, median of the portfolio = 1'),
  column('ln_priority', 'number', 'ln S', 'median of the natural logarithm of the priority'),
  column('ln_priority_sd', 'number', 'Spread of ln S', 'standard deviation of ln S'),
  column(
    'demand_rank',
    'whole',
    'Demand rank',
    'place by spectral demand alone (the larger S_a of the two directions at their median periods); the first place of those with equal demand',
  ),
  column('demand_rank_last', 'whole', 'Demand rank, last', 'last place of those with equal demand'),
  column('governing', 'text', 'Governing direction', 'the direction with the larger priority in the leading case'),
  column('period_longitudinal_s', 'number', 'Period, longitudinal', 'median', 's'),
  column('period_longitudinal_16_s', 'number', 'Period, longitudinal, 16 %', '16th percentile', 's'),
  column('period_longitudinal_84_s', 'number', 'Period, longitudinal, 84 %', '84th percentile', 's'),
  column('period_transverse_s', 'number', 'Period, transverse', 'median', 's'),
  column('period_transverse_16_s', 'number', 'Period, transverse, 16 %', '16th percentile', 's'),
  column('period_transverse_84_s', 'number', 'Period, transverse, 84 %', '84th percentile', 's'),
  column('period_evidence', 'text', 'Period from', 'measured, formula, stiffness, or formula and stiffness'),
  column(
    'period_basis',
    'text',
    'Basis of the period',
    'what the formula that counts was fitted to: best-fit, design or ambient; else measured or mechanics',
  ),
  column('sa_g', 'number', 'Spectral demand', 'S_a read by the leading case in the governing direction', 'g'),
  column(
    'sa_level_2_g',
    'number',
    'Spectral demand, second level',
    'S_a of the second level at the same period; blank with one level',
    'g',
  ),
  column('capacity_g', 'number', 'Capacity', 'capacity of the leading case in the governing direction', 'g'),
  column('demand_over_capacity', 'number', 'Demand over capacity', 'of the leading case'),
  column('people_exposed', 'number', 'People exposed', 'people present on average over the week'),
  column('slope_k', 'number', 'k', 'slope of the hazard curve'),
  column('spectrum', 'text', 'Spectrum', 'name of the spectrum read at the ranking level'),
  column('case_system', 'text', 'System of the leading case', 'given, or the most likely'),
  column('case_edition', 'text', 'Code of the leading case', 'code edition, or no seismic design'),
  column('case_chance', 'number', 'Chance of the leading case', '1 when system and era are known'),
  column('weak_type', 'text', 'Weak type', 'known weak structural type, the most likely one'),
  column('weak_chance', 'number', 'Chance of a weak type', 'summed over the cases'),
  column('flags', 'text', 'Flags', 'codes, separated by blanks'),
  column('not_ranked', 'text', 'Not ranked because', 'reason; blank when ranked'),
];

/** A building counts as of a weak type when that is at least as likely as not. */
export const LIKELY_WEAK = 0.5;
