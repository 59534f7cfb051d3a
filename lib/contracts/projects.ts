import { z } from "zod";
import { emailAddress, personName } from "./accounts";
import { plainText } from "./plain-text";

const line = (what: string, limit: number) =>
  plainText(limit)
    .transform((typed) => typed.replace(/\s+/g, " ").trim())
    .refine((text) => text !== "", `${what} is needed.`);
const optionalLine = (limit: number) =>
  plainText(limit).transform((typed) => typed.replace(/\s+/g, " ").trim());
const number = (what: string, least: number, most: number) =>
  z
    .number(`${what} is a number.`)
    .min(least, `${what} is at least ${least}.`)
    .max(most, `${what} is at most ${most}.`);

/** Factors and limits that checks answer to. The interface angle has no common value and is always stated. */
export const criteriaFields = z.strictObject({
  slidingFactor: number("The factor against sliding", 1, 10),
  overturningFactor: number("The factor against overturning", 1, 10),
  upliftFactor: number("The factor against uplift", 1, 10),
  interfaceAngle_deg: number("The angle of friction under the base", 0, 50),
  adhesion_kPa: number("The adhesion under the base", 0, 1000),
  permanentWithinMiddleThird: z.boolean("Say whether permanent loads stay within the middle third."),
  transientMinContactRatio: number("The contact ratio for transient loads", 0.05, 1),
  accidentalMinContactRatio: number("The contact ratio for accidental loads", 0.05, 1),
  nearestHoleLimit_m: number("The distance to the nearest hole", 1, 1000),
});
export type CriteriaFields = z.output<typeof criteriaFields>;

const settings = {
  number: line("A project number", 40),
  title: line("A title", 200),
  client: optionalLine(200),
  gridName: line("The name of the site grid", 200),
  epsgCode: z
    .int("An EPSG code is a whole number.")
    .min(1024, "EPSG codes run from 1024.")
    .max(32767, "EPSG codes run to 32767.")
    .nullable(),
  gridOriginEasting_m: number("The origin's easting", -1e8, 1e8),
  gridOriginNorthing_m: number("The origin's northing", -1e8, 1e8),
  gridRotation_deg: number("The rotation", -360, 360),
  gridScale: number("The scale", 0.5, 2),
  datumName: line("The vertical datum", 200),
  structuralZero_m: number("The structural zero", -12000, 10000).nullable(),
  unitSystem: z.enum(["si", "kip-ft", "tonne-metre"], "Choose the units of the project."),
  reportingStandard: optionalLine(200),
};

/** Opens a project: grid and datum by name first of all, the criteria of its checks, and who leads it. */
export const createProjectInput = z.strictObject({
  ...settings,
  client: settings.client.default(""),
  epsgCode: settings.epsgCode.default(null),
  gridOriginEasting_m: settings.gridOriginEasting_m.default(0),
  gridOriginNorthing_m: settings.gridOriginNorthing_m.default(0),
  gridRotation_deg: settings.gridRotation_deg.default(0),
  gridScale: settings.gridScale.default(1),
  structuralZero_m: settings.structuralZero_m.default(null),
  reportingStandard: settings.reportingStandard.default(""),
  leadName: personName,
  leadEmail: emailAddress,
  criteria: criteriaFields,
});

/** Changes settings of a project; what is left out stays. Grid and datum need a reason once ground or footings exist. */
export const changeProjectInput = z
  .strictObject({ ...settings, reason: plainText(1000) })
  .partial()
  .extend({ revision: z.int().optional() });

/** Sets new criteria under the next number; the reason is kept with them. */
export const changeCriteriaInput = criteriaFields.extend({
  reason: line("A reason", 1000),
  revision: z.int().optional(),
});

/** Reads the audit trail from the newest back. */
export const readAuditInput = z.strictObject({
  search: plainText(200).default(""),
  before: z.coerce.number().int().min(1).max(Number.MAX_SAFE_INTEGER).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});

export type ProjectRow = { id: string; number: string; title: string; client: string; roles: string[] };
export type CriteriaRow = CriteriaFields & { number: number; reason: string; setBy: string; setAt: string };
export type ProjectFacts = {
  id: string;
  number: string;
  title: string;
  client: string;
  gridName: string;
  epsgCode: number | null;
  gridOriginEasting_m: number;
  gridOriginNorthing_m: number;
  gridRotation_deg: number;
  gridScale: number;
  datumName: string;
  structuralZero_m: number | null;
  unitSystem: "si" | "kip-ft" | "tonne-metre";
  reportingStandard: string;
  currentCriteria: number;
  revision: number;
  roles: string[];
  criteria: CriteriaRow;
};
export type AuditRow = {
  seq: number;
  at: string;
  actor: string;
  roles: string;
  verb: string;
  subject: string;
  detail: Record<string, unknown>;
  requestId: string;
  hash: string;
};
export type AuditPage = { events: AuditRow[]; next: number | null };
