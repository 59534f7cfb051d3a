import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { type Line, line } from "../formula";
import {
  eccentricity,
  kernSum,
  peakPressureFull,
  peakPressurePartial,
  peakPressureTwoAxes,
} from "./formulas";
import {
  type ContactCorner,
  contactCorners,
  KERN_TOLERANCE,
  type PressurePlane,
  pressurePlane,
} from "./solve";

export const distributions = ["uniform", "trapezoidal", "triangular", "partial", "none"] as const;
export type Distribution = (typeof distributions)[number];

export type BaseLoad = {
  breadth_m: number;
  length_m: number;
  vertical_kN: number;
  momentB_kNm: number;
  momentL_kNm: number;
};

/** A base's pressure; figures are null where there is no equilibrium and so no pressure to speak of. */
export type BasePressure = {
  equilibrium: boolean;
  distribution: Distribution;
  eccentricityB_m: number | null;
  eccentricityL_m: number | null;
  /** 6|eB|/B + 6|eL|/L: at most 1 inside the middle third. */
  kernSum: number | null;
  withinMiddleThird: boolean;
  maxPressure_kPa: number | null;
  minPressure_kPa: number | null;
  /** Order +B+L, −B+L, −B−L, +B−L; zero where there is no contact. */
  cornerPressures_kPa: [number, number, number, number] | null;
  contactRatio: number;
};

/** Largest error in load and moments that an answer may have; more is said to be no equilibrium, never a pass. */
const RESIDUAL_LIMIT = 1e-9;

const noPressure = (eB: number | null, eL: number | null, kern: number | null): BasePressure => ({
  equilibrium: false,
  distribution: "none",
  eccentricityB_m: eB,
  eccentricityL_m: eL,
  kernSum: kern,
  withinMiddleThird: false,
  maxPressure_kPa: null,
  minPressure_kPa: null,
  cornerPressures_kPa: null,
  contactRatio: 0,
});

/** A share of nothing has no size: what overflows is not given out as a figure. */
const finiteOrNull = (figure: number): number | null => (Number.isFinite(figure) ? figure : null);

/** Pressure under the base for one load; figures are null without equilibrium. The form that checks use in bulk. */
export function solveBase(load: BaseLoad): BasePressure {
  const { breadth_m, length_m, vertical_kN, momentB_kNm, momentL_kNm } = load;
  if (!(vertical_kN > 0)) return noPressure(null, null, null);
  const eB = momentB_kNm / vertical_kN;
  const eL = momentL_kNm / vertical_kN;
  const xi = Math.abs(eB) / breadth_m;
  const eta = Math.abs(eL) / length_m;
  const kern = 6 * xi + 6 * eta;
  if (!(xi < 0.5 && eta < 0.5)) return noPressure(finiteOrNull(eB), finiteOrNull(eL), finiteOrNull(kern));
  const plane = pressurePlane(xi, eta);
  if (!(plane.residual <= RESIDUAL_LIMIT)) return noPressure(eB, eL, kern);
  const { peak, slopeB, slopeL } = plane;
  const mean_kPa = vertical_kN / (breadth_m * length_m);
  const loaded_kPa = mean_kPa * peak;
  const acrossB_kPa = mean_kPa * Math.max(0, peak - slopeB);
  const acrossL_kPa = mean_kPa * Math.max(0, peak - slopeL);
  const far_kPa = mean_kPa * Math.max(0, peak - slopeB - slopeL);
  const corners: BasePressure["cornerPressures_kPa"] =
    eL < 0
      ? eB < 0
        ? [far_kPa, acrossL_kPa, loaded_kPa, acrossB_kPa]
        : [acrossL_kPa, far_kPa, acrossB_kPa, loaded_kPa]
      : eB < 0
        ? [acrossB_kPa, loaded_kPa, acrossL_kPa, far_kPa]
        : [loaded_kPa, acrossB_kPa, far_kPa, acrossL_kPa];
  return {
    equilibrium: true,
    distribution: distributionOf(plane, eB, eL, kern),
    eccentricityB_m: eB,
    eccentricityL_m: eL,
    kernSum: kern,
    withinMiddleThird: kern <= 1 + KERN_TOLERANCE,
    maxPressure_kPa: loaded_kPa,
    minPressure_kPa: plane.zone === "full" ? far_kPa : 0,
    cornerPressures_kPa: corners,
    contactRatio: plane.contactRatio,
  };
}

function distributionOf(plane: PressurePlane, eB: number, eL: number, kern: number): Distribution {
  if (eB === 0 && eL === 0) return "uniform";
  const oneAxis = eB === 0 || eL === 0;
  if (oneAxis && kern >= 1 - KERN_TOLERANCE) return "triangular";
  return plane.zone === "full" ? "trapezoidal" : "partial";
}

type Point = [alongB_m: number, alongL_m: number];

/** The contact area as points from the centre of the base, anticlockwise, and the line where the pressure ends. */
export function contactOutline(load: BaseLoad): {
  contactPolygon_m: Point[];
  neutralAxis: { from_m: Point; to_m: Point } | null;
} {
  const { breadth_m, length_m, vertical_kN, momentB_kNm, momentL_kNm } = load;
  if (!solveBase(load).equilibrium) return { contactPolygon_m: [], neutralAxis: null };
  const eB = momentB_kNm / vertical_kN;
  const eL = momentL_kNm / vertical_kN;
  const signB = eB < 0 ? -1 : 1;
  const signL = eL < 0 ? -1 : 1;
  const { corners, ends } = contactCorners(pressurePlane(Math.abs(eB) / breadth_m, Math.abs(eL) / length_m));
  const place = ([x, y]: ContactCorner): Point => [
    signB * (0.5 - x) * breadth_m,
    signL * (0.5 - y) * length_m,
  ];
  const contactPolygon_m = corners.map(place);
  if (signB !== signL) contactPolygon_m.reverse();
  return {
    contactPolygon_m,
    neutralAxis: ends === null ? null : { from_m: place(ends[0]), to_m: place(ends[1]) },
  };
}

const inputs = z.strictObject({
  breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
  length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
  vertical_kN: quantity({ label: "Vertical load at the base", unit: "kN" }),
  momentB_kNm: quantity({ label: "Moment along B", unit: "kNm" }).default(0),
  momentL_kNm: quantity({ label: "Moment along L", unit: "kNm" }).default(0),
});

const point = z.tuple([z.number(), z.number()]);

export const basePressure = defineMethod({
  id: "base-pressure",
  version: "1",
  title: "Pressure under a rigid base",
  source: ["statics", "gec6"],
  limits: [
    "A rigid base with linear pressure; the ground carries no tension.",
    "The resultant lies strictly inside the base; on or outside the edge there is no equilibrium.",
  ],
  inputs,
  outputs: z.object({
    equilibrium: z.boolean().meta({ label: "Equilibrium", unit: "" }),
    distribution: z.enum(distributions).meta({ label: "Distribution", unit: "" }),
    eccentricityB_m: output("Eccentricity along B", "m").nullable(),
    eccentricityL_m: output("Eccentricity along L", "m").nullable(),
    kernSum: output("6|eB|/B + 6|eL|/L").nullable(),
    withinMiddleThird: z.boolean().meta({ label: "Within the middle third", unit: "" }),
    maxPressure_kPa: output("Largest pressure", "kPa").nullable(),
    minPressure_kPa: output("Smallest pressure", "kPa").nullable(),
    cornerPressures_kPa: z
      .tuple([z.number(), z.number(), z.number(), z.number()])
      .nullable()
      .meta({ label: "Corner pressures +B+L, −B+L, −B−L, +B−L", unit: "kPa" }),
    contactRatio: output("Contact area over B·L"),
    contactPolygon_m: z.array(point).meta({ label: "Contact area, points from the centre", unit: "m" }),
    neutralAxis: z
      .object({ from_m: point, to_m: point })
      .nullable()
      .meta({ label: "Line where the pressure ends", unit: "m" }),
  }),
  compute: (load) => ({ ...solveBase(load), ...contactOutline(load) }),
  lines: basePressureLines,
});

/** The steps of a base pressure, for the sheet. */
export function basePressureLines(load: BaseLoad): Line[] {
  const { breadth_m, length_m, vertical_kN } = load;
  const solved = solveBase(load);
  if (!(vertical_kN > 0)) return [];
  const steps = [
    { ...line(eccentricity, { moment_kNm: load.momentB_kNm, vertical_kN }), symbol: "e_B" },
    { ...line(eccentricity, { moment_kNm: load.momentL_kNm, vertical_kN }), symbol: "e_L" },
  ];
  const eccentricityB_m = Math.abs(solved.eccentricityB_m ?? 0);
  const eccentricityL_m = Math.abs(solved.eccentricityL_m ?? 0);
  steps.push(line(kernSum, { breadth_m, length_m, eccentricityB_m, eccentricityL_m }));
  if (!solved.equilibrium || solved.maxPressure_kPa === null) return steps;
  if (solved.contactRatio === 1)
    steps.push(
      line(peakPressureFull, { vertical_kN, breadth_m, length_m, eccentricityB_m, eccentricityL_m }),
    );
  else if (eccentricityL_m === 0)
    steps.push(
      line(peakPressurePartial, {
        vertical_kN,
        width_m: length_m,
        side_m: breadth_m,
        eccentricity_m: eccentricityB_m,
      }),
    );
  else if (eccentricityB_m === 0)
    steps.push(
      line(peakPressurePartial, {
        vertical_kN,
        width_m: breadth_m,
        side_m: length_m,
        eccentricity_m: eccentricityL_m,
      }),
    );
  else {
    const peakFactor = (solved.maxPressure_kPa * breadth_m * length_m) / vertical_kN;
    steps.push(line(peakPressureTwoAxes, { peakFactor, vertical_kN, breadth_m, length_m }));
  }
  return steps;
}
