/** A number from outside the program that a record must reproduce. */
import type { CarriedId } from '../../src/engineering/capacity/families.js';
import type { Inputs } from '../../src/engineering/formula.js';

export interface ReferenceCase {
  readonly id: string;
  /** Record id. */
  readonly method: string;
  /** In our names and SI units. */
  readonly inputs: Inputs;
  /** An edition of a code reads the record, with what a study states for the place: the inputs are those it gives it. */
  readonly edition?: { readonly id: CarriedId; readonly stated: unknown };
  readonly expected: number;
  /** Half of the last printed digit unless `note` says why it is more. */
  readonly tolerance: number;
  readonly source: string;
  /**
   * printed: read in the publication itself; restated: the number stands in a page that restates it; memory: recalled;
   * own arithmetic: the stated formula worked by hand, where no printed answer was found.
   */
  readonly mark: 'printed' | 'restated' | 'memory' | 'own arithmetic';
  readonly note?: string;
}

/** Exact definitions (NIST SP 811), spelled out here so that the cases do not lean on the program's own table. */
export const FT_M = 0.3048;
export const IN_M = 0.0254;
export const LBF_KN = 0.0044482216152605;

/** Half a unit in the last of `digits` decimals. */
export const half = (digits: number): number => 0.5 * 10 ** -digits;

/** Arithmetic carried to the digits shown: agreement to 1e-9 of the value. */
export const exactly = (expected: number): { readonly expected: number; readonly tolerance: number } => ({
  expected,
  tolerance: Math.abs(expected) * 1e-9,
});

/** A printed circular frequency (rad/s) as the period it stands for, with half its last digit carried over. */
export const fromOmega = (
  omega: number,
  digits: number,
): { readonly expected: number; readonly tolerance: number } => ({
  expected: (2 * Math.PI) / omega,
  tolerance: ((2 * Math.PI) / (omega * omega)) * half(digits),
});
