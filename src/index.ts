/**
 * The jobs of swaymark without a terminal. Paths are those of study files; what a person can mend comes as `UserError`.
 * @packageDocumentation
 */
export { Bug, EXIT, UserError, exitCodeOf, formatError } from './errors.js';
export type { Place, Problem } from './errors.js';

export { loadStudy, studyFromText } from './study/load.js';
export type { LoadedStudy } from './study/load.js';
export { studyJsonSchema } from './study/schema.js';
export type { Study } from './study/schema.js';

export { checkStudy } from './exports/check-study.js';
export type { CheckOptions, CheckedStudy } from './exports/check-study.js';
export { screenStudy } from './exports/screen-study.js';
export type { ScreenStudyOptions, ScreenedStudy } from './exports/screen-study.js';

export { explain, listStudyRuns, pageDataOfStudy, periods, periodsOfClass, withStudyDatabase } from './runs/open.js';
export type { RunChoice } from './runs/open.js';
export { latestRun, listRuns, runById } from './runs/history.js';
export type { RunEntry } from './runs/history.js';
export type { Explanation } from './screening/explain.js';
export type { PeriodClass, PeriodSheet } from './screening/period-sheet.js';
export type { Estimate, EstimateKind } from './engineering/assess/estimate.js';
export type { ClassEstimate } from './engineering/assess/class-estimates.js';
export type { HandStep } from './engineering/hand.js';
export type { Display } from './engineering/format.js';

export { METHODS, findMethod } from './engineering/methods.js';
export { calculate, methodCalled } from './engineering/calc.js';
export type { Calculation } from './engineering/calc.js';
export { handSteps } from './engineering/hand.js';
export type { AnyRecord } from './engineering/formula.js';

export { readSpectrum, spectrumNames } from './exports/spectrum-reading.js';
export type { Ordinate, SpectrumSheet } from './exports/spectrum-reading.js';
export { reviewSheet } from './exports/review.js';
export type { ReviewSheet } from './exports/review.js';

export { renderDashboard } from './reports/dashboard.js';
export { readPageScript } from './reports/page-script.js';
export { renderSummary } from './reports/summary.js';
export type { PageBuildings, PageData, PageSummary } from './engineering/page-contract.js';
