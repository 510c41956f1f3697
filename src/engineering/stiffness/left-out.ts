/** Relations of mass and stiffness that were looked at and are no record, with the reason. */
import type { LeftOut } from '../period/left-out.js';

export const STIFFNESS_LEFT_OUT: readonly LeftOut[] = [
  {
    row: 'Composite cantilever of an infilled frame (ASCE 41-13 and 41-17, chapter 11)',
    reason: 'its printed form was not seen; the strut of FEMA 356 is held',
  },
  {
    row: 'One cantilever with both flexibilities as T_f √(1 + 5.0 EI/(G A_s H²))',
    reason: 'the sum of squares written otherwise: the record of two flexibilities one after the other holds it',
  },
  {
    row: 'Frame over wall by system (α under 1.5 walls, 1.5 to 5 dual, 5 to 20 frames)',
    reason: 'a guide for drift factors where only the system is known, no formula',
  },
  {
    row: 'NZS 3101 table C6.6, columns and walls',
    reason: 'three recalled points each by axial force; between them the table is not known',
  },
  {
    row: 'Coupling beams by span over depth, shear stiffness of cracked walls (ACI 369.1)',
    reason: 'no route asks for them; the band of cracking covers them',
  },
  {
    row: 'Italian masonry classes and adobe (Circolare 7/2019 table C8.5.I, handbooks)',
    reason: 'recalled ranges of the modulus, no formula',
  },
  {
    row: 'Bed-joint shear and flexural tension of masonry (FEMA 356)',
    reason: 'strengths, which no period asks for',
  },
  {
    row: 'Timber diaphragm deflection (SDPWS eq. 4.2-1) and the four-term panel wall (APA TT-053)',
    reason: 'their inputs stand in no inventory; the three-term panel wall is held',
  },
  { row: 'Japanese wood wall multiplier (order 46)', reason: 'recalled, of medium confidence, for one country' },
  {
    row: 'Depth over which the velocity of the ground is averaged (NIST GCR 12-917-21)',
    reason: 'inventories give the velocity of the upper 30 m and no profile',
  },
  {
    row: 'Base-slab and embedment averaging (FEMA P-2091), base shear on soft ground (ASCE 7-05 and 7-16, chapter 19)',
    reason: 'they reduce the force, not the period',
  },
  {
    row: 'Live load shares of the seismic weight by code',
    reason: 'the unit weights hold dead and seismic live load together; a stated weight replaces them',
  },
];
