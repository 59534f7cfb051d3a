import type { ReferenceCase } from "../reference-case";
import { allowableBearingCases } from "./allowable-bearing";
import { basePressureCases } from "./base-pressure";
import { bearingFactorCases } from "./bearing-factors";
import { bearingResistanceCases } from "./bearing-resistance";
import { characteristicCases } from "./characteristic-values";
import { consolidationCases } from "./consolidation";
import { distortionCases } from "./distortion";
import { footingCheckCases } from "./footing-check";
import { layeredCases, plateCases } from "./layers-and-plates";
import { sptAllowableCases, sptCorrectionCases } from "./penetration-tests";
import { presumptiveCases } from "./presumptive";
import { elasticCases } from "./settlement-elastic";
import { burlandCases, schmertmannCases } from "./settlement-sand";
import { effectiveAreaCases, overturningCases, slidingCases, upliftCases } from "./stability";
import { stressCases } from "./stress";
import { valueTableCases } from "./value-tables";

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
