import { z } from "zod";
import { type Soil, soils } from "./ground-words";
import type { DocumentRevisionId, GroundUnitId, HoleId, HoleRevisionId, StratumId, UploadId } from "./ids";
import { plainText } from "./plain-text";

const uuid = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);
const filled = (label: string, limit: number) =>
  plainText(limit)
    .transform((text) => text.trim())
    .refine((text) => text !== "", `${label} is missing.`);
const metres = (label: string, min: number, max: number) =>
  z
    .number(`${label} is a finite number of metres.`)
    .min(min, `${label} is too small.`)
    .max(max, `${label} is too large.`);

export const unitFields = {
  code: filled("Code", 20),
  name: filled("Name", 120),
  description: plainText(2000).default(""),
  soil: z.enum(soils, { error: "Choose the principal soil." }),
  position: z.int().min(0).max(10_000).default(0),
};
export const createUnitInput = z.strictObject(unitFields);
export const changeUnitInput = z.strictObject({
  ...unitFields,
  groundUnitId: uuid<GroundUnitId>(),
  revision: z.int(),
});

export const stratumInput = z
  .strictObject({
    top_m: metres("Top", 0, 12_000),
    base_m: metres("Base", 0, 12_000),
    description: filled("Description", 4000),
    legendCode: plainText(20).default(""),
    geologyCode: plainText(60).default(""),
    groundUnitId: uuid<GroundUnitId>().nullable().default(null),
  })
  .refine((s) => s.base_m > s.top_m, { message: "The base lies above the top.", path: ["base_m"] });

export const sptInput = z.strictObject({
  depth_m: metres("Depth", 0, 12_000),
  blowCount: z.int("N is a whole number.").min(0).max(1000).nullable().default(null),
  refusal: z.boolean().default(false),
  mainBlows: z.int().min(0).max(1000).nullable().default(null),
  mainPenetration_mm: z.number().min(0).max(1000).nullable().default(null),
  reportText: plainText(200).default(""),
});
export const strikeInput = z.strictObject({
  depth_m: metres("Depth", 0, 12_000),
  remarks: plainText(500).default(""),
});

const logFields = {
  kind: filled("Kind", 40),
  status: z.string().max(20).default(""),
  easting_m: metres("Easting", -1e8, 1e8),
  northing_m: metres("Northing", -1e8, 1e8),
  groundLevel_m: metres("Ground level", -12_000, 10_000).nullable(),
  finalDepth_m: metres("Final depth", 0, 12_000),
  startedOn: plainText(30).default(""),
  endedOn: plainText(30).default(""),
  loggedBy: plainText(200).default(""),
  remarks: plainText(4000).default(""),
  sourceRevisionId: uuid<DocumentRevisionId>().nullable().default(null),
  sourcePage: z.int().min(1).max(100_000).nullable().default(null),
  strata: z.array(stratumInput).max(500).default([]),
  spts: z.array(sptInput).max(500).default([]),
  strikes: z.array(strikeInput).max(100).default([]),
};
export const createHoleInput = z.strictObject({ name: filled("Hole", 60), ...logFields });
/** A corrected log: a new revision of the hole, whole, with the reason. */
export const reviseHoleInput = z.strictObject({
  ...logFields,
  holeId: uuid<HoleId>(),
  revision: z.int(),
  reason: filled("Reason", 1000),
});

export const assignStrataInput = z
  .strictObject({
    groundUnitId: uuid<GroundUnitId>().nullable(),
    stratumIds: z.array(uuid<StratumId>()).min(1).max(50_000).optional(),
    /** In bulk: every stratum of the current logs whose words or codes match. */
    matching: z
      .strictObject({
        description: plainText(200).default(""),
        geologyCode: plainText(60).default(""),
        legendCode: plainText(20).default(""),
        onlyUnassigned: z.boolean().default(true),
      })
      .optional(),
  })
  .refine((given) => (given.stratumIds === undefined) !== (given.matching === undefined), {
    message: "Say which strata, or what they match.",
    path: ["stratumIds"],
  });
export const readHoleInput = z.strictObject({ holeId: uuid<HoleId>() });

export const previewGroundInput = z.strictObject({ uploadId: uuid<UploadId>() });
export const acceptGroundInput = z.strictObject({
  uploadId: uuid<UploadId>(),
  reference: filled("Reference", 60),
  title: filled("Title", 200),
  /** What the preview asked to be confirmed, by code. */
  confirmed: z.array(z.string().max(60)).max(20).default([]),
  /** SHA-256 of the file that the preview spoke of: another file is not accepted in its place. */
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
});

export type UnitRow = {
  id: GroundUnitId;
  revision: number;
  code: string;
  name: string;
  description: string;
  soil: Soil;
  position: number;
  strata: number;
};
export type HoleRow = {
  id: HoleId;
  revision: number;
  name: string;
  revisionId: HoleRevisionId;
  number: number;
  kind: string;
  status: string;
  easting_m: number | null;
  northing_m: number | null;
  groundLevel_m: number | null;
  finalDepth_m: number | null;
  strata: number;
  unassigned: number;
  spts: number;
  strikes: number;
};
export type StratumRow = {
  id: StratumId;
  holeId: HoleId;
  hole: string;
  top_m: number;
  base_m: number | null;
  description: string;
  legendCode: string;
  geologyCode: string;
  soil: Soil | "";
  madeGround: boolean;
  groundUnitId: GroundUnitId | null;
  groundUnit: string | null;
};
export type SptRow = {
  depth_m: number;
  kind: string;
  blowCount: number | null;
  refusal: boolean;
  mainBlows: number | null;
  mainPenetration_mm: number | null;
  reportText: string;
  waterText: string;
};
export type StrikeRow = {
  depth_m: number;
  at: string;
  remarks: string;
  rises: { minutes: number; depth_m: number | null; text: string }[];
};
export type HolePage = HoleRow & {
  givenEasting_m: number | null;
  givenNorthing_m: number | null;
  givenGrid: string;
  givenDatum: string;
  startedOn: string;
  endedOn: string;
  termination: string;
  loggedBy: string;
  remarks: string;
  reason: string;
  recordedBy: string;
  recordedAt: string;
  source: {
    documentId: string;
    documentRevisionId: string;
    reference: string;
    code: string;
    page: number | null;
  } | null;
  dataIssue: { fileName: string; issueNumber: string; dataStatus: string; line: number | null } | null;
  strataRows: StratumRow[];
  sptRows: SptRow[];
  strikeRows: StrikeRow[];
  revisions: { id: HoleRevisionId; number: number; reason: string; recordedBy: string; recordedAt: string }[];
};

export type GroundFinding = {
  rule: string;
  line: number | null;
  group: string;
  heading: string;
  severity: string;
  message: string;
};
export type GroundPreview = {
  sha256: string;
  fileName: string;
  edition: string;
  statedEdition: string | null;
  /** One sentence when the file cannot be taken at all. */
  refused: string | null;
  identity: {
    projectId: string;
    projectName: string;
    issueNumber: string;
    issueDate: string;
    dataStatus: string;
    producer: string;
  };
  counts: { holes: number; strata: number; spts: number; strikes: number; otherGroups: string[] };
  holes: {
    added: string[];
    changed: string[];
    unchanged: number;
    missing: string[];
    unlocated: number;
    withoutLevel: number;
  };
  findings: GroundFinding[];
  findingCounts: Record<string, number>;
  /** What must be confirmed before the file is accepted. */
  questions: { code: string; sentence: string }[];
};
