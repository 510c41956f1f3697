/** Inputs that several records take, spelled once. */
import type { InputSpec } from '../formula.js';
import type { Source } from '../source.js';

/** A quantity whose unit ends its name. */
export function quantity<U extends string>(stem: string, unit: U, meaning: string): InputSpec {
  return { name: `${stem}_${unit}`, kind: 'number', unit, meaning };
}
/** A list of quantities. */
export function list(stem: string, unit: string, meaning: string): InputSpec {
  return { name: `${stem}_${unit}`, kind: 'list', unit, meaning };
}
/** A pure number. */
export function plain(name: string, meaning: string): InputSpec {
  return { name, kind: 'number', meaning };
}

export const MASS = quantity('mass', 't', 'mass of a floor');
export const STIFFNESS = quantity('stiffness', 'kN_per_m', 'lateral stiffness of a storey');
export const MASSES = list('masses', 't', 'floor masses, bottom to top');
export const STIFFNESSES = list('storey_stiffness', 'kN_per_m', 'storey stiffness, bottom to top');
export const HEIGHTS = list('storey_heights', 'm', 'storey heights, bottom to top');
export const STOREYS = plain('storeys', 'number of equal storeys');
export const MODULUS = quantity('modulus', 'MPa', 'modulus of elasticity');
export const STOREY_HEIGHT = quantity('storey_height', 'm', 'storey height');
export const HEIGHT = quantity('height', 'm', 'height above the base');

/** Mechanics that every textbook has, with the place that says it best. */
export const mechanics = (clause: string): Source => ({ standard: 'structural dynamics', edition: '', clause });

/** The constants of a family that has none. */
export type None = Record<never, number>;
