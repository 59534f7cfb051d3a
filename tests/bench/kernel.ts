import { checkFooting } from "@/lib/check/check-footing";
import { type FootingCheckInput, footingCheckInput } from "@/lib/check/input";
import { solveBase } from "@/lib/methods/base-pressure/index";
import { compare } from "./measure";

const PADS = 20_000;
const COMBINATIONS = 8;

/** Chance that is the same on every run. */
function* chance(seed: number): Generator<number, never> {
  let state = seed;
  for (;;) {
    state = (state * 1664525 + 1013904223) % 4294967296;
    yield state / 4294967296;
  }
}

/** Pads with eight combinations each, about a third of them partial on two axes. */
function pads(): FootingCheckInput[] {
  const random = chance(11);
  const next = () => random.next().value;
  return Array.from({ length: PADS }, () => {
    const breadth_m = 1.5 + 2 * next();
    const length_m = breadth_m * (1 + next());
    return footingCheckInput.parse({
      footing: { breadth_m, length_m, thickness_m: 0.6, groundLevel_m: 10, foundingLevel_m: 8.6 },
      loads: Array.from({ length: COMBINATIONS }, (_, at) => {
        const vertical_kN = 200 + 900 * next();
        const lean = at % 3 === 0 ? 0.14 + 0.22 * next() : 0.06 * next();
        return {
          name: `C${at + 1}`,
          duration: at === 1 ? "permanent" : "transient",
          vertical_kN,
          momentB_kNm: vertical_kN * breadth_m * lean * (next() > 0.5 ? 1 : -1),
          momentL_kNm: vertical_kN * length_m * lean * 0.8,
          horizontalB_kN: 0.02 * vertical_kN * next(),
          horizontalL_kN: 0,
        };
      }),
      value: { kind: "single", netAllowable_kPa: 220, soilUnitWeight_kNm3: 18, groundwaterLevel_m: 9 },
      criteria: { interfaceAngle_deg: 25 },
    });
  });
}

/** The whole check against its bare pressure solves on the same load cases. */
export async function kernel() {
  const inputs = pads();
  const bases = inputs.flatMap((input) =>
    checkFooting(input).combinations.map((combination) => ({
      breadth_m: input.footing.breadth_m,
      length_m: input.footing.length_m,
      vertical_kN: combination.baseVertical_kN,
      momentB_kNm: combination.momentB_kNm,
      momentL_kNm: combination.momentL_kNm,
    })),
  );
  const partial = bases.filter((base) => solveBase(base).distribution === "partial").length / bases.length;
  let kept = 0;
  const result = await compare({
    what: `footing-check, ${PADS} pads × ${COMBINATIONS} combinations (${(100 * partial).toFixed(0)} % partial on two axes) against bare pressure solves`,
    goal: "at most 2 ×",
    repetitions: 9,
    warmUps: 3,
    ours: () => {
      for (const input of inputs) kept += checkFooting(input).combinations.length;
    },
    bare: () => {
      for (const base of bases) kept += solveBase(base).contactRatio;
    },
  });
  if (!(kept > 0)) throw new Error("Nothing was computed.");
  const perSecond = PADS / (result.ours.median / 1000);
  return [{ ...result, note: `${result.note} ${Math.round(perSecond)} footings a second`.trim() }];
}
