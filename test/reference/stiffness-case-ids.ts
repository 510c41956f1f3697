/** The rows of the stiffness case file: each is run as a reference case, or listed here with the reason. */

/** Every id of the file. */
export const STIFFNESS_CASE_IDS: readonly string[] = [
  ...['SD-01', 'SD-02', 'SD-04', 'SD-05', 'SD-07', 'SD-08', 'SD-10', 'SD-11', 'SD-13', 'SD-14', 'SD-16', 'SD-17'],
  ...['SD-19', 'SD-20', 'SD-22', 'SD-23', 'SD-25', 'SD-26', 'SD-28', 'SD-29', 'SD-31', 'SD-32', 'SD-34', 'SD-35'],
  ...['SD-37', 'SD-38', 'SD-40', 'SD-41', 'SD-43', 'SD-44', 'SD-46', 'SD-47', 'SD-49', 'SD-50', 'SD-52', 'SD-53'],
  ...['SD-55', 'SD-56', 'SD-58', 'SD-59', 'SD-61', 'SD-62', 'SD-64', 'SD-65', 'SD-67', 'SD-68', 'SD-70', 'SD-72'],
];

/** Rows whose quantity no record computes yet. */
export const NOT_RUN: Readonly<Record<string, string>> = {};
