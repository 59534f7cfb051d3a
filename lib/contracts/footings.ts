import { z } from "zod";
import type { CheckRow, Standing, VerdictWord } from "./checks";
import { durations, type LoadBasis, loadBases, type StageWord, stages } from "./footing-words";
import type {
  CheckId,
  DocumentRevisionId,
  FootingId,
  GroundUnitId,
  LoadSetId,
  PersonId,
  ValueId,
  ValueRevisionId,
  ZoneId,
} from "./ids";
import { plainText } from "./plain-text";

export const uuidOf = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);

const quantity = (what: string, unit: string, least: number, most: number) =>
  z
    .number(`${what} is a number${unit === "" ? "" : ` in ${unit}`}, with a point before the decimals.`)
    .min(least, `${what} is at least ${least}${unit === "" ? "" : ` ${unit}`}.`)
    .max(most, `${what} is at most ${most}${unit === "" ? "" : ` ${unit}`}.`);

/** One load combination at the load level: N down positive; momentB tips along the breadth, momentL along the length. */
export const loadCombination = z.strictObject({
  name: plainText(60).trim().min(1, "A combination has a name."),
  duration: z.enum(durations, `One of: ${durations.join(", ")}.`),
  vertical_kN: quantity("The vertical load", "kN", -1e6, 1e6),
  momentB_kNm: quantity("The moment along B", "kNm", -1e7, 1e7),
  momentL_kNm: quantity("The moment along L", "kNm", -1e7, 1e7),
  horizontalB_kN: quantity("The horizontal load along B", "kN", -1e6, 1e6),
  horizontalL_kN: quantity("The horizontal load along L", "kN", -1e6, 1e6),
});
export type LoadCombination = z.output<typeof loadCombination>;

/** The combinations of one footing: each name once, as many as an engineer can still read. */
export const loadCombinations = z
  .array(loadCombination, "A list of load combinations.")
  .min(1, "At least one load combination.")
  .max(200, "At most 200 combinations for one footing.")
  .superRefine((combinations, refinement) => {
    const seen = new Set<string>();
    combinations.forEach(({ name }, index) => {
      const key = name.toLowerCase();
      if (seen.has(key))
        refinement.addIssue({
          code: "custom",
          path: [index, "name"],
          message: `There are two combinations named ${name}.`,
        });
      seen.add(key);
    });
  });

const loadsFields = {
  loadBasis: z.enum(
    loadBases,
    "Say on which basis the loads are: characteristic or design. There is no default.",
  ),
  source: plainText(300).trim().default(""),
  combinations: loadCombinations,
};

export const mark = plainText(40)
  .transform((typed) => typed.replace(/\s+/g, " ").trim())
  .refine((text) => text !== "", "A mark is needed.");

/** Size, place and levels of a pad, as one revision of a footing holds them. */
export const geometryFields = {
  easting_m: quantity("The easting", "m", -1e8, 1e8),
  northing_m: quantity("The northing", "m", -1e8, 1e8),
  orientation_deg: quantity("The orientation", "degrees", -360, 360).default(0),
  breadth_m: quantity("The breadth", "m", 0.1, 100),
  length_m: quantity("The length", "m", 0.1, 100),
  thickness_m: quantity("The thickness", "m", 0.05, 20),
  groundLevel_m: quantity("The ground level", "m", -500, 9000),
  foundingLevel_m: quantity("The founding level", "m", -600, 9000),
  loadHeight_m: quantity("The height of the loads above founding level", "m", 0, 50).nullable().default(null),
  concreteUnitWeight_kNm3: quantity("The unit weight of concrete", "kN/m³", 10, 40).default(24),
  backfillUnitWeight_kNm3: quantity("The unit weight of backfill", "kN/m³", 0, 30).default(18),
};

export const footingFields = z.strictObject({
  mark,
  gridReference: plainText(40).trim().default(""),
  ownerId: uuidOf<PersonId>().nullable().default(null),
  ...geometryFields,
  note: plainText(2000).trim().default(""),
  sourceRevisionId: uuidOf<DocumentRevisionId>().nullable().default(null),
});

/** A founding level above the ground, or more than 50 m below it, is a slip of the pen. */
export function levelsIssue(given: { groundLevel_m: number; foundingLevel_m: number }): string | null {
  if (given.foundingLevel_m > given.groundLevel_m) return "The founding level lies above the ground level.";
  if (given.groundLevel_m - given.foundingLevel_m > 50)
    return "The founding level lies more than 50 m below the ground level.";
  return null;
}

const refineLevels = (
  given: { groundLevel_m: number; foundingLevel_m: number },
  refinement: z.RefinementCtx,
) => {
  const issue = levelsIssue(given);
  if (issue) refinement.addIssue({ code: "custom", path: ["foundingLevel_m"], message: issue });
};

const footingId = uuidOf<FootingId>();
const revision = z.int().optional();

export const createFootingInput = footingFields
  .extend({ loads: z.strictObject(loadsFields).nullable().default(null) })
  .superRefine(refineLevels);
export const editFootingInput = footingFields
  .extend({
    footingId,
    revision,
    reason: plainText(1000).trim().default(""),
  })
  .superRefine(refineLevels);
export const setLoadsInput = z.strictObject({
  footingId,
  revision,
  ...loadsFields,
  reason: plainText(1000).trim().default(""),
});
export const readFootingInput = z.strictObject({ footingId });

/** A stage on site; going back needs a note that says why. */
export const recordStageInput = z.strictObject({
  footingId,
  revision,
  stage: z.enum(stages, `One of: ${stages.join(", ")}.`),
  reachedOn: z.iso.date("A date, as 2026-04-30."),
  note: plainText(2000).trim().default(""),
});

export const footingSorts = ["mark", "utilisation", "required", "level", "stage"] as const;
export type FootingSort = (typeof footingSorts)[number];
export const standingFilters = ["current", "affected", "unchecked"] as const;

const ratio = z.coerce.number("A utilisation is a number.").min(0).max(1e6);
const filters = {
  zoneId: uuidOf<ZoneId>().optional(),
  groundUnitId: uuidOf<GroundUnitId>().optional(),
  valueId: uuidOf<ValueId>().optional(),
  linked: z.enum(["yes", "no"]).optional(),
  standing: z.enum(standingFilters).optional(),
  verdict: z.enum(["passes", "fails", "outside conditions"]).optional(),
  stage: z.enum(stages).optional(),
  ownerId: uuidOf<PersonId>().optional(),
  utilisationFrom: ratio.optional(),
  utilisationTo: ratio.optional(),
  search: plainText(100).optional(),
};
export const listFootingsInput = z.strictObject({
  ...filters,
  sort: z.enum(footingSorts).default("mark"),
  descending: z.enum(["yes", "no"]).default("no"),
  /** As the page before gave it in `next`. */
  after: plainText(300).optional(),
  limit: z.coerce.number().int().min(1).max(500).default(100),
  /** Whether the first page counts all that match. */
  counts: z.enum(["yes", "no"]).default("yes"),
});
/** The ids that a filter selects, for acting on all of them. */
export const selectFootingsInput = z.strictObject(filters);

export const confirmLinksInput = z.strictObject({
  links: z
    .array(z.strictObject({ footingId, valueId: uuidOf<ValueId>() }))
    .min(1, "Choose at least one footing.")
    .max(20_000, "At most 20,000 footings at once."),
});
export const chooseLinkInput = z.strictObject({
  footingIds: z
    .array(footingId)
    .min(1, "Choose at least one footing.")
    .max(20_000, "At most 20,000 footings at once."),
  /** Null takes the link away. */
  valueId: uuidOf<ValueId>().nullable(),
  reason: plainText(1000).trim().min(10, "Say why in a sentence: it stands with the link for ever."),
});
export const suggestLinksInput = z.strictObject({
  footingIds: z
    .array(footingId)
    .min(1, "Choose at least one footing.")
    .max(20_000, "At most 20,000 footings at once."),
});

/** Eight megabytes of text: more than any schedule of footings. */
export const IMPORT_LIMIT_BYTES = 8_000_000;
const file = {
  content: z.string("The text of the file.").max(IMPORT_LIMIT_BYTES, "The file is larger than 8 MB."),
  fileName: plainText(300).default(""),
};
const acceptance = {
  /** As the preview gave it: the register must still be as it was shown. */
  fingerprint: z.string().length(64, "The fingerprint of the preview."),
  /** Rows in error are left out; without this the whole file is refused when there is one. */
  leaveOutErrors: z.boolean().default(false),
  reason: plainText(1000).trim().default(""),
};
export const previewFootingImportInput = z.strictObject(file);
export const acceptFootingImportInput = z.strictObject({ ...file, ...acceptance });
const basisOfFile = { loadBasis: loadsFields.loadBasis, source: loadsFields.source };
export const previewLoadImportInput = z.strictObject({ ...file, ...basisOfFile });
/** A file of loads with an error is refused whole: without the row in error a footing would be checked for too little. */
export const acceptLoadImportInput = z.strictObject({
  ...file,
  ...basisOfFile,
  fingerprint: acceptance.fingerprint,
  reason: acceptance.reason,
});

export type CreateFootingInput = z.input<typeof createFootingInput>;
export type EditFootingInput = z.input<typeof editFootingInput>;
export type SetLoadsInput = z.input<typeof setLoadsInput>;
export type ReadFootingInput = z.input<typeof readFootingInput>;
export type RecordStageInput = z.input<typeof recordStageInput>;
export type ListFootingsInput = z.input<typeof listFootingsInput>;
export type SelectFootingsInput = z.input<typeof selectFootingsInput>;
export type ConfirmLinksInput = z.input<typeof confirmLinksInput>;
export type ChooseLinkInput = z.input<typeof chooseLinkInput>;
export type SuggestLinksInput = z.input<typeof suggestLinksInput>;
export type PreviewFootingImportInput = z.input<typeof previewFootingImportInput>;
export type AcceptFootingImportInput = z.input<typeof acceptFootingImportInput>;
export type PreviewLoadImportInput = z.input<typeof previewLoadImportInput>;
export type AcceptLoadImportInput = z.input<typeof acceptLoadImportInput>;

/** What footings can be narrowed to, owned by and linked to. */
export type FootingChoices = {
  zones: { id: string; name: string }[];
  groundUnits: { id: string; code: string; name: string }[];
  owners: { id: string; name: string }[];
  values: { id: string; reference: string; label: string }[];
};

export type Named = { id: PersonId; name: string };

/** The value that a footing is linked to, with its revision in force. */
export type LinkedValue = {
  id: ValueId;
  reference: string;
  zone: { id: ZoneId; name: string };
  groundUnit: { id: GroundUnitId; code: string; name: string };
  /** Null when the value has no revision in force. */
  current: {
    id: ValueRevisionId;
    code: string;
    netAllowable_kPa: number | null;
    basis: "recommended" | "assumed" | "presumptive";
    purpose: "preliminary" | "for-design";
  } | null;
};

export type LatestCheck = {
  id: CheckId;
  verdict: VerdictWord;
  utilisation: number | null;
  requiredNet_kPa: number | null;
  standing: Standing;
  reasons: string[];
  /** Number of the value revision that counts now, for the sign of a standing that is affected. */
  currentNumber: number | null;
  code: string;
  netAllowable_kPa: number | null;
};

export type FootingItem = {
  id: FootingId;
  revision: number;
  mark: string;
  gridReference: string;
  owner: Named | null;
  stage: StageWord;
  easting_m: number;
  northing_m: number;
  orientation_deg: number;
  breadth_m: number;
  length_m: number;
  thickness_m: number;
  groundLevel_m: number;
  foundingLevel_m: number;
  combinations: number;
  value: LinkedValue | null;
  check: LatestCheck | null;
};

/** How many of the listed footings stand how. The four verdict words add up to `total`. */
export type FootingCounts = {
  total: number;
  passes: number;
  fails: number;
  outside: number;
  unchecked: number;
  affected: number;
  unlinked: number;
};
export type FootingList = {
  items: FootingItem[];
  next: string | null;
  /** Of all that match, on the first page alone. */
  counts: FootingCounts | null;
};

export type FootingGeometry = {
  number: number;
  easting_m: number;
  northing_m: number;
  orientation_deg: number;
  breadth_m: number;
  length_m: number;
  thickness_m: number;
  groundLevel_m: number;
  foundingLevel_m: number;
  loadHeight_m: number;
  concreteUnitWeight_kNm3: number;
  backfillUnitWeight_kNm3: number;
  note: string;
  recordedBy: string;
  recordedAt: string;
};
export type FootingLoads = {
  id: LoadSetId;
  number: number;
  loadBasis: LoadBasis;
  source: string;
  combinations: LoadCombination[];
  recordedBy: string;
  recordedAt: string;
};
export type LinkEvent = {
  number: number;
  value: { id: ValueId; reference: string } | null;
  how: "from-zone" | "chosen" | "removed";
  reason: string;
  linkedBy: string;
  linkedAt: string;
};
export type StageEvent = {
  number: number;
  stage: StageWord;
  reachedOn: string;
  note: string;
  recordedBy: string;
  recordedAt: string;
};

export type FootingDetail = FootingItem & {
  /** The footing's history of sizes and levels, the newest first. */
  geometry: FootingGeometry[];
  loads: FootingLoads[];
  links: LinkEvent[];
  stageEvents: StageEvent[];
  checks: CheckRow[];
  /** Changes that wait for an answer about this footing. */
  openConsequences: { id: string; changeId: string; title: string; outcome: string; madeAt: string }[];
  /** Exploratory holes within the project's limit, the nearest first. */
  holesNear: { id: string; name: string; distance_m: number }[];
  /** Why formation acceptance and pouring are held; null when they are not. */
  hold: string | null;
};

/** One proposal for one footing, with what else could be meant. */
export type LinkSuggestion = {
  footingId: FootingId;
  mark: string;
  linkedTo: ValueId | null;
  /** The value proposed; null when no single one follows from the zones. */
  valueId: ValueId | null;
  /** Why this one, or why none, in a sentence. */
  sentence: string;
  straddles: boolean;
  candidates: LinkCandidate[];
};
export type LinkCandidate = {
  valueId: ValueId;
  reference: string;
  zone: string;
  groundUnit: string;
  code: string | null;
  netAllowable_kPa: number | null;
  /** Part of the footprint inside the value's zone. */
  share: number;
};

export type ImportFinding = {
  row: number | null;
  column: string | null;
  severity: "error" | "warning" | "note";
  message: string;
};
export type ImportChange = { field: string; unit: string; before: string; after: string };
export type ImportRow = {
  row: number;
  mark: string;
  what: "new" | "changed" | "unchanged";
  changes: ImportChange[];
};
/** What a file would do to the register. Nothing of it is written. */
export type ImportPreview = {
  /** Why the file cannot be read at all; null when it can. */
  refused: string | null;
  fingerprint: string;
  rowCount: number;
  counts: { new: number; changed: number; unchanged: number; inError: number; missing: number };
  /** At most 2,000 rows that would change something; the counts say how many there are. */
  rows: ImportRow[];
  findings: ImportFinding[];
  findingCount: number;
  /** Marks of the register that the file does not have; they stay as they are. */
  missing: string[];
  columns: Record<string, string>;
};
export type ImportAnswer = { new: number; changed: number; unchanged: number; leftOut: number };
