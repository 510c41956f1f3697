/** One switch of a sensitivity run. */
import type { AssessSettings } from '../engineering/assess/settings.js';

/** How the value of the run was come by. */
export type Mark = 'study' | 'judgement' | 'memory' | 'restated' | 'two levels';

/** One assumption taken otherwise than in the run. */
export interface Switch {
  /** Id of the entry of the register. */
  readonly assumption: string;
  /** What is done, in a few words; no two alike. */
  readonly to: string;
  /** What it was, where the register's value says more than that. */
  readonly from?: string;
  readonly settings: AssessSettings;
  /** How it was come by, where the register's source speaks of several numbers. */
  readonly mark?: Mark;
  /** Periods change: a slope read from two levels at the median period is read again. */
  readonly newPeriods?: boolean;
}
