import { z } from "zod";
import type { Explained } from "@/lib/check/explain-check";
import type { FootingCheckInput, FootingCheckResult } from "@/lib/check/input";
import type { CheckId, FootingId, ValueId, ValueRevisionId } from "./ids";

const uuid = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);

export const verdicts = ["passes", "fails", "outside conditions"] as const;
export type VerdictWord = (typeof verdicts)[number];
export type Standing = "current" | "affected" | "replaced";

/**
 * Which footings to check. There is no field for a pressure, and unknown fields are refused: a check reads its bearing
 * pressure from the value revision in force and from nowhere else.
 */
export const runChecksInput = z
  .strictObject({
    footingIds: z
      .array(uuid<FootingId>())
      .min(1, "Choose at least one footing.")
      .max(20_000, "At most 20,000 footings at once.")
      .optional(),
    /** Every footing that is linked to a value. */
    all: z.literal(true).optional(),
  })
  .refine(({ footingIds, all }) => (footingIds === undefined) !== (all === undefined), {
    message: "Say which footings, or all.",
    path: ["footingIds"],
  });
export const readCheckInput = z.strictObject({ checkId: uuid<CheckId>() });

export type RunChecksInput = z.input<typeof runChecksInput>;
export type ReadCheckInput = z.input<typeof readCheckInput>;

export type NotChecked = { footingId: FootingId; mark: string; reason: string };
export type RunChecksAnswer = {
  checked: number;
  counts: Record<VerdictWord, number>;
  /** Open consequences that these checks answered. */
  answered: number;
  notCheckedCount: number;
  /** The first thousand footings that could not be checked, each with why. */
  notChecked: NotChecked[];
  /** The check of the one footing, when only one was asked for and could be checked. */
  checkId: CheckId | null;
};

/** One check in a footing's history. */
export type CheckRow = {
  id: CheckId;
  seq: number;
  runBy: string;
  runAt: string;
  verdict: VerdictWord;
  utilisation: number | null;
  utilisationBearing: number | null;
  requiredNet_kPa: number | null;
  governingCombination: string;
  valueId: ValueId;
  valueReference: string;
  valueRevisionId: ValueRevisionId;
  code: string;
  netAllowable_kPa: number | null;
  criteriaNumber: number;
  engineVersion: string;
  standing: Standing;
  reasons: string[];
};

/** What the register knows beyond the figures: bases that must agree, levels that must hold, doubts that must be said. */
export type RegisterConditions = {
  reference: string;
  code: string;
  loadBasis: string;
  valueLoadBasis: string;
  highestFoundingLevel_m: number | null;
  lowestFoundingLevel_m: number | null;
  basis: "recommended" | "assumed" | "presumptive";
  purpose: "preliminary" | "for-design";
  confirmBy: string | null;
  confirmWho: string | null;
  /** Names of the holes whose logs the check pins, the nearest first; null where they were not looked for. */
  holesNear: string[] | null;
  nearestHoleLimit_m: number;
};

/** Exactly what a check was given. `npm run replay` runs it again from this and compares every digit. */
export type CheckSnapshot = { input: FootingCheckInput; register: RegisterConditions };

/** A stored check whole, with the steps of its calculation and, for each combination, where the base is in contact. */
export type CheckDetail = CheckRow & {
  snapshot: CheckSnapshot;
  result: FootingCheckResult;
  explained: Explained;
  contactPolygons_m: [alongB_m: number, alongL_m: number][][];
  value: {
    zone: string;
    groundUnit: string;
    soil: string;
    basis: RegisterConditions["basis"];
    conditions: string;
    given: string;
    givenBasis: "net" | "gross";
    governedBy: string;
    sources: { reference: string; code: string; page: number | null; clause: string }[];
  };
};
