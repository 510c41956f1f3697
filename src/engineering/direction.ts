/** The two plan directions of a building: along its longer and its shorter side. */
export const DIRECTIONS = ['longitudinal', 'transverse'] as const;
export type DirectionName = (typeof DIRECTIONS)[number];
