import { allowableBearing } from "./allowable-bearing/index";
import { basePressure } from "./base-pressure/index";
import { bearingFactors } from "./bearing-factors/index";
import { bearingResistance } from "./bearing-resistance/index";
import type { RegisteredMethod } from "./define-method";
import { effectiveArea } from "./effective-area/index";
import { overturning } from "./overturning/index";
import { sliding } from "./sliding/index";
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
  valueTable,
];
