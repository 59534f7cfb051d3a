import { allowableBearing } from "./allowable-bearing/index";
import { basePressure } from "./base-pressure/index";
import { bearingFactors } from "./bearing-factors/index";
import { bearingResistance } from "./bearing-resistance/index";
import { characteristicValue } from "./characteristic-value/index";
import type { RegisteredMethod } from "./define-method";
import { effectiveArea } from "./effective-area/index";
import { layeredBearing } from "./layered-bearing/index";
import { overturning } from "./overturning/index";
import { plateLoad } from "./plate-load/index";
import { presumptiveBearing } from "./presumptive-bearing/index";
import { settlementBurlandBurbidge } from "./settlement-burland-burbidge/index";
import { settlementConsolidation } from "./settlement-consolidation/index";
import { settlementElastic } from "./settlement-elastic/index";
import { settlementSchmertmann } from "./settlement-schmertmann/index";
import { sliding } from "./sliding/index";
import { sptAllowable } from "./spt-allowable/index";
import { sptCorrection } from "./spt-correction/index";
import { stressIncrease } from "./stress-increase/index";
import { uplift } from "./uplift/index";
import { valueTable } from "./value-table/index";

/** Every published method, in the order that they are shown. Adding one touches its folder, this list and its cases. */
export const methods: readonly RegisteredMethod[] = [
  basePressure,
  effectiveArea,
  sliding,
  overturning,
  uplift,
  bearingFactors,
  bearingResistance,
  allowableBearing,
  presumptiveBearing,
  sptCorrection,
  sptAllowable,
  layeredBearing,
  plateLoad,
  characteristicValue,
  valueTable,
  stressIncrease,
  settlementElastic,
  settlementSchmertmann,
  settlementBurlandBurbidge,
  settlementConsolidation,
];
