/** What a compiled spectrum says about its parameters, as codes with their words. */
import type { CompiledSpectrum } from './compiled.js';

export const SPECTRUM_FLAGS: Readonly<Record<string, string>> = {
  'default-site-class': "The site class is not known; the code's rule for a default class is taken.",
  'rock-unmeasured': 'Rock judged class B without a measured shear-wave velocity: site coefficients of 1.0.',
  'supplement-3':
    'S_M1 is raised by half, since the tabulated F_v is starred for this class and S_1 (Supplement 3 of ASCE 7-16).',
  'site-specific-required':
    'The tabulated F_v is starred for this class and S_1: ASCE 7-16 11.4.8 asks for a site-specific study or Supplement 3.',
  'contains-reduction': 'The spectrum contains a behaviour factor: it serves base shear, not the ranking.',
  'contains-overstrength':
    'The ordinates hold an overstrength already [from memory], so they lie below an elastic spectrum: compare within this code only.',
  'zone-return-limit': 'The product of zone factor and return factor is held at 0.7.',
  'long-site-factor-held': 'The site factor at 5 s is held for 10 s: our sheet has none for this class [judgement].',
};

/** The flags of a spectrum in words. */
export function flagWords({ flags }: Pick<CompiledSpectrum, 'flags'>): readonly string[] {
  return (flags ?? []).map((flag) => SPECTRUM_FLAGS[flag] ?? flag);
}
