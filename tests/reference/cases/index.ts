import type { ReferenceCase } from "../reference-case";
import { basePressureCases } from "./base-pressure";
import { allowableBearingCases, bearingFactorCases, bearingResistanceCases } from "./bearing";
import { footingCheckCases } from "./footing-check";
import {
  characteristicCases,
  layeredCases,
  plateCases,
  presumptiveCases,
  sptAllowableCases,
  sptCorrectionCases,
  valueTableCases,
} from "./ground-values";
import {
  burlandCases,
  consolidationCases,
  distortionCases,
  elasticCases,
  schmertmannCases,
  stressCases,
} from "./settlement";
import { effectiveAreaCases, overturningCases, slidingCases, upliftCases } from "./stability";

/** Every reference case of every method, as data: the tests run them, and a page can show them. */
export const referenceCases: readonly ReferenceCase[] = [
  ...basePressureCases,
  ...effectiveAreaCases,
  ...slidingCases,
  ...overturningCases,
  ...upliftCases,
  ...bearingFactorCases,
  ...bearingResistanceCases,
  ...allowableBearingCases,
  ...presumptiveCases,
  ...sptCorrectionCases,
  ...sptAllowableCases,
  ...layeredCases,
  ...plateCases,
  ...characteristicCases,
  ...valueTableCases,
  ...stressCases,
  ...elasticCases,
  ...schmertmannCases,
  ...burlandCases,
  ...consolidationCases,
  ...distortionCases,
  ...footingCheckCases,
];
