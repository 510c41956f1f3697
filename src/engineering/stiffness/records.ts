/** Every record of mass and stiffness. */
import type { AnyRecord } from '../formula.js';
import { BRACE } from './braces.js';
import { CHAIN_SHAPE_RECORDS } from './chain-shape.js';
import { CHAIN_RECORDS } from './chain.js';
import { CONTINUUM_RECORDS } from './continuum.js';
import { CRACKING_RECORDS } from './cracking.js';
import { ENERGY_RECORDS } from './energy.js';
import { FRAME_RECORDS } from './frames.js';
import { INFILL_RECORDS } from './infill.js';
import { MATERIAL_RECORDS } from './materials.js';
import { MUTO_RECORDS } from './muto.js';
import { SOIL_RECORDS } from './soil.js';
import { TIMBER_RECORDS } from './timber.js';
import { WALL_FRAME_RECORDS } from './wall-frame.js';
import { WALL_SUM_RECORDS } from './wall-sums.js';
import { WALL_RECORDS } from './walls.js';
import { WEIGHT_RECORDS } from './weight.js';

export const STIFFNESS_RECORDS: readonly AnyRecord[] = [
  ...CHAIN_RECORDS,
  ...CHAIN_SHAPE_RECORDS,
  ...ENERGY_RECORDS,
  ...FRAME_RECORDS,
  ...MUTO_RECORDS,
  ...WALL_RECORDS,
  ...WALL_SUM_RECORDS,
  BRACE,
  ...INFILL_RECORDS,
  ...CONTINUUM_RECORDS,
  ...WALL_FRAME_RECORDS,
  ...MATERIAL_RECORDS,
  ...CRACKING_RECORDS,
  ...WEIGHT_RECORDS,
  ...SOIL_RECORDS,
  ...TIMBER_RECORDS,
];
