import type { Mapping } from "./mapping";
import { baseMappings } from "./shared-base";
import { bearingMappings } from "./shared-bearing";
import { settlementMappings } from "./shared-settlement";

/** One mapping a topic. Null: the case is of something that no method of ours computes. */
export const mappings: Record<string, Mapping> = {
  ...baseMappings,
  ...settlementMappings,
  ...bearingMappings,
};
