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

export { refreshStudy, sweepStudy } from './exports/refresh-study.js';
export type {
  RefreshChoice,
  RefreshStudyOptions,
  RefreshedStudy,
  SweepStudyOptions,
  SweptStudy,
} from './exports/refresh-study.js';
export { parameterFromText, rangeFromText } from './study/parameters.js';
export type { Parameter, ParameterRange } from './study/parameters.js';
export type { ListChange, ListMove } from './screening/list-changes.js';
export type { SweptValue } from './screening/sweep.js';

export { surveyStudy } from './exports/survey-study.js';
export type { PlannedSurvey, SurveyChoice } from './exports/survey-study.js';
export type { SurveyPlan, SurveyStep } from './screening/survey.js';
export { takeAnswers } from './exports/take-answers.js';
export type { TakenAnswers } from './exports/take-answers.js';
export { listAnswers, withdrawAnswers } from './exports/held-answers.js';
export type { WithdrawChoice } from './exports/held-answers.js';
export type { HeldAnswer } from './inventory/kept-answers.js';
export { budgetStudy } from './exports/budget-study.js';
export type { BudgetStudyOptions } from './exports/budget-study.js';
export type { BudgetBatch, BudgetBuilding, BudgetOverride, BudgetPlan } from './screening/budget-plan.js';
export type { CostFrom } from './screening/budget-inputs.js';

export { sensitivityStudy } from './exports/sensitivity-study.js';
export type { SensitivityStudyOptions } from './exports/sensitivity-study.js';
export type { HeldPlace, Sensitivity, SwitchEffect } from './screening/sensitivity.js';
export type { NotSwitched } from './screening/switches.js';

export { compareStudy } from './exports/compare-study.js';
export type { ComparedStudies, CompareStudyOptions } from './exports/compare-study.js';
export type { Comparison, ExplainedMove, OneSided, SettingChange } from './screening/compare-runs.js';
export type { ComparedRun } from './screening/read-compared.js';
export type { FieldCount, InputChange } from './screening/compare-inputs.js';
export { kendallTauB } from './engineering/numeric/kendall.js';

export {
  explain,
  listStudyRuns,
  noteRun,
  pageDataOfStudy,
  periods,
  periodsOfClass,
  showRun,
  withStudyDatabase,
} from './runs/open.js';
export { deleteStudyRuns, planStudyDeletion } from './exports/delete-runs.js';
export type { StudyDeletion } from './exports/delete-runs.js';
export type { Deletion, InventoryEntry } from './runs/delete.js';
export type { ListedBuilding, RunChanges, RunSheet, SettingDifference } from './runs/sheet.js';
export type { FolderRun, RunChoice } from './runs/open.js';
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

export { renderComparison } from './reports/compare.js';
export { renderDashboard } from './reports/dashboard.js';
export { readPageScript } from './reports/page-script.js';
export { renderSummary } from './reports/summary.js';
export type { PageBuildings, PageData, PageSummary } from './engineering/page-contract.js';
