import fc from "fast-check";
import type { CheckedLoad, FootingCheckInput } from "@/lib/check/input";

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

const load: fc.Arbitrary<CheckedLoad> = fc.record({
  name: fc.string({ minLength: 1, maxLength: 8 }),
  duration: fc.constantFrom("permanent", "transient", "accidental"),
  vertical_kN: number(-200, 3000),
  momentB_kNm: number(-400, 400),
  momentL_kNm: number(-400, 400),
  horizontalB_kN: number(-150, 150),
  horizontalL_kN: number(-150, 150),
});

/** Pads of ordinary size under ordinary loads, some of which fail, against a single value. */
export const checks: fc.Arbitrary<FootingCheckInput> = fc.record({
  footing: fc
    .record({
      breadth_m: number(0.5, 6),
      length_m: number(0.5, 6),
      thickness_m: number(0.3, 1.2),
      depth_m: number(0.5, 4),
      loadHeight_m: number(0, 3),
    })
    .map(({ depth_m, ...size }) => ({
      ...size,
      groundLevel_m: 100,
      foundingLevel_m: 100 - depth_m,
      concreteUnitWeight_kNm3: 24,
      backfillUnitWeight_kNm3: 18,
    })),
  loads: fc.array(load, { minLength: 1, maxLength: 6 }),
  value: fc.record({
    kind: fc.constant("single" as const),
    netAllowable_kPa: number(50, 600),
    comparedWith: fc.constantFrom("maximum" as const, "effective-area" as const),
    soilUnitWeight_kNm3: number(15, 22),
    groundwaterLevel_m: fc.option(number(95, 100), { nil: null }),
    minFoundingDepth_m: fc.constant(null),
    minBreadth_m: fc.constant(null),
    maxBreadth_m: fc.constant(null),
    durationFactors: fc.record({ transient: number(1, 1.5), accidental: number(1, 2) }),
  }),
  criteria: fc.record({
    slidingFactor: fc.constant(1.5),
    overturningFactor: fc.constant(1.5),
    upliftFactor: fc.constant(1.1),
    interfaceAngle_deg: number(15, 40),
    adhesion_kPa: fc.constantFrom(0, 10),
    permanentWithinMiddleThird: fc.boolean(),
    transientMinContactRatio: fc.constant(0.5),
    accidentalMinContactRatio: fc.constant(0.3),
  }),
});

/**
 * A pad of 2 m by 2 m by 0.5 m, 1 m deep, that a central load N presses N/4 + 3 kPa net, against 150 kPa. Parts of it can be
 * said otherwise.
 */
export function pad(
  parts: {
    footing?: Partial<FootingCheckInput["footing"]>;
    loads?: Partial<CheckedLoad>[];
    value?: Record<string, unknown>;
    criteria?: Partial<FootingCheckInput["criteria"]>;
  } = {},
): FootingCheckInput {
  return {
    footing: {
      breadth_m: 2,
      length_m: 2,
      thickness_m: 0.5,
      groundLevel_m: 11,
      foundingLevel_m: 10,
      loadHeight_m: 0.5,
      concreteUnitWeight_kNm3: 24,
      backfillUnitWeight_kNm3: 18,
      ...parts.footing,
    },
    loads: (parts.loads ?? [{}]).map((load, at) => ({
      name: `C${at + 1}`,
      duration: "permanent",
      vertical_kN: 400,
      momentB_kNm: 0,
      momentL_kNm: 0,
      horizontalB_kN: 0,
      horizontalL_kN: 0,
      ...load,
    })),
    value: {
      ...(parts.value?.kind === undefined ? { kind: "single", netAllowable_kPa: 150 } : {}),
      comparedWith: "maximum",
      soilUnitWeight_kNm3: 18,
      groundwaterLevel_m: null,
      minFoundingDepth_m: null,
      minBreadth_m: null,
      maxBreadth_m: null,
      durationFactors: { transient: 1, accidental: 1 },
      ...parts.value,
    } as FootingCheckInput["value"],
    criteria: {
      slidingFactor: 1.5,
      overturningFactor: 1.5,
      upliftFactor: 1.1,
      interfaceAngle_deg: 30,
      adhesion_kPa: 0,
      permanentWithinMiddleThird: true,
      transientMinContactRatio: 0.5,
      accidentalMinContactRatio: 0.5,
      ...parts.criteria,
    },
  };
}
