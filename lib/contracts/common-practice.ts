/**
 * Factors that are common practice for pads where a project states none (common practice, from memory). Offered, never
 * applied by themselves: a person confirms or changes each. The angle of friction under the base depends on the ground
 * and on how the base is cast: no common value is offered for it.
 */
export const commonPractice = {
  slidingFactor: 1.5,
  overturningFactor: 1.5,
  upliftFactor: 1.1,
  adhesion_kPa: 0,
  permanentWithinMiddleThird: true,
  transientMinContactRatio: 0.5,
  accidentalMinContactRatio: 0.5,
  nearestHoleLimit_m: 25,
} as const;
