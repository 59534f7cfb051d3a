import { allowableBearing } from "./allowable-bearing/index";
import { basePressure } from "./base-pressure/index";
import { bearingFactors } from "./bearing-factors/index";
import { bearingResistance } from "./bearing-resistance/index";
import type { Method } from "./define-method";
import { effectiveArea } from "./effective-area/index";
import { overturning } from "./overturning/index";
import { sliding } from "./sliding/index";
import { uplift } from "./uplift/index";
import { valueTable } from "./value-table/index";

/** Every published method, in the order that they are shown. Adding one touches its folder, this list and its cases. */
export const methods: readonly Method<never, unknown>[] = [
  basePressure,
  effectiveArea,
  sliding,
  overturning,
  uplift,
  bearingFactors,
  bearingResistance,
  allowableBearing,
  valueTable,
] as unknown as readonly Method<never, unknown>[];
