import { z } from "zod";
import type {
  DocumentId,
  DocumentRevisionId,
  GroundUnitId,
  PersonId,
  ValueId,
  ValueRevisionId,
  ZoneId,
} from "./ids";
import { plainText } from "./plain-text";
import type { ValueFieldName } from "./value-words";

const uuid = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);

/** A quantity as typed: kept word for word in the draft, read with its unit when the draft is checked. */
const typed = z.union([plainText(60), z.number()], "A number, or a number with its unit.").nullable();

const choice = <const Words extends readonly [string, ...string[]]>(...words: Words) =>
  z.enum(words, `One of: ${words.join(", ")}.`).nullable();

/** One piece of evidence: a page of one revision of a document, and the holes that it speaks of. */
export const draftSource = z.strictObject({
  documentRevisionId: uuid<DocumentRevisionId>(),
  page: z
    .int("A whole page number.")
    .min(1, "Pages begin at 1.")
    .max(100_000, "No report has so many pages.")
    .nullable(),
  clause: plainText(200),
  note: plainText(1000),
  holes: z.array(plainText(60)).max(200, "At most 200 holes."),
});

/** The draft of a revision: any field may still be missing. Choices that a person must make have no default. */
export const draftContent = z
  .strictObject({
    given: typed,
    givenBasis: choice("net", "gross"),
    givenOverburden_kPa: typed,
    factorConvention: choice("net-over-factor", "gross-over-factor", "not-stated"),
    factorOfSafety: typed,
    comparedWith: choice("maximum", "effective-area"),
    loadBasis: choice("characteristic-full", "characteristic-reduced", "design-factored"),
    governedBy: choice("strength", "settlement", "not-stated"),
    settlementLimit_mm: typed,
    settlementPredicted_mm: typed,
    minBreadth_m: typed,
    maxBreadth_m: typed,
    minFoundingDepth_m: typed,
    highestFoundingLevel_m: typed,
    lowestFoundingLevel_m: typed,
    groundwaterLevel_m: typed,
    groundwaterBasis: plainText(1000),
    soilUnitWeight_kNm3: typed,
    drainage: choice("drained", "undrained", "both"),
    transientIncrease: choice("none", "granted"),
    transientFactor: typed,
    accidentalFactor: typed,
    neighbours: plainText(2000),
    conditions: plainText(4000),
    basis: choice("recommended", "assumed", "presumptive"),
    confirmBy: plainText(10).nullable(),
    confirmWho: plainText(200).nullable(),
    purpose: choice("preliminary", "for-design"),
    reasonCode: choice(
      "first",
      "new-hole",
      "laboratory",
      "water",
      "plate-test",
      "formation",
      "loads",
      "error",
      "report",
    ),
    reason: plainText(4000),
    sources: z.array(draftSource).max(50, "At most 50 sources."),
  })
  .partial();
export type DraftContent = z.output<typeof draftContent>;

const valueId = uuid<ValueId>();
const revision = z.int().optional();

export const createValueInput = z.strictObject({
  zoneId: uuid<ZoneId>(),
  groundUnitId: uuid<GroundUnitId>(),
  /** Left out, the next free BV-number is taken. */
  reference: z
    .string()
    .trim()
    .regex(
      /^[A-Za-z0-9][A-Za-z0-9 ./_-]{0,39}$/,
      "1 to 40 letters, digits, spaces or . / _ -, beginning with one of the first two.",
    )
    .optional(),
});
export const listValuesInput = z.strictObject({
  zoneId: uuid<ZoneId>().optional(),
  groundUnitId: uuid<GroundUnitId>().optional(),
  state: z.enum(["issued", "checked", "draft", "withdrawn", "empty"]).optional(),
  search: plainText(100).optional(),
});
export const readValueInput = z.strictObject({ valueId });
export const saveDraftInput = z.strictObject({ valueId, content: draftContent, revision });
export const discardDraftInput = z.strictObject({ valueId, revision });
export const checkDraftInput = z.strictObject({
  valueId,
  revision,
  /** Findings that ask "sure?", named by code: each has to be confirmed by the checker. */
  confirmed: z.array(plainText(60)).max(20).default([]),
});
export const issueRevisionInput = z.strictObject({ valueId, revisionId: uuid<ValueRevisionId>(), revision });
export const withdrawRevisionInput = z.strictObject({
  valueId,
  revisionId: uuid<ValueRevisionId>(),
  revision,
  reason: plainText(4000)
    .trim()
    .min(10, "Say why in a sentence: it is read by everyone who relies on the value."),
});
export const confirmSourceInput = z.strictObject({
  valueId,
  revisionId: uuid<ValueRevisionId>(),
  documentRevisionId: uuid<DocumentRevisionId>(),
  reason: plainText(4000).trim().min(10, "Say in a sentence why the value stands as it is."),
});
export const previewRevisionInput = z.strictObject({
  valueId,
  /** A pressure to try instead of the draft's own, in kPa net. */
  netAllowable_kPa: z.coerce
    .number("A pressure in kPa.")
    .positive("A pressure above zero.")
    .max(1e6)
    .optional(),
});

export type CreateValueInput = z.input<typeof createValueInput>;
export type ListValuesInput = z.input<typeof listValuesInput>;
export type SaveDraftInput = z.input<typeof saveDraftInput>;
export type CheckDraftInput = z.input<typeof checkDraftInput>;
export type IssueRevisionInput = z.input<typeof issueRevisionInput>;
export type WithdrawRevisionInput = z.input<typeof withdrawRevisionInput>;

/** Something worth a second look that does not forbid: asked as "sure?", with where the doubt comes from. */
export type DraftFinding = { code: string; field: string; sentence: string; source: string };

/** The fields that a revision states, in SI; what every reader of a value sees. */
export type StatedFields = {
  netAllowable_kPa: number;
  given: string;
  givenBasis: "net" | "gross";
  given_kPa: number;
  givenOverburden_kPa: number | null;
  factorConvention: "net-over-factor" | "gross-over-factor" | "not-stated";
  factorOfSafety: number | null;
  comparedWith: "maximum" | "effective-area";
  loadBasis: "characteristic-full" | "characteristic-reduced" | "design-factored";
  governedBy: "strength" | "settlement" | "not-stated";
  settlementLimit_mm: number | null;
  settlementPredicted_mm: number | null;
  minBreadth_m: number | null;
  maxBreadth_m: number | null;
  minFoundingDepth_m: number | null;
  highestFoundingLevel_m: number | null;
  lowestFoundingLevel_m: number | null;
  groundwaterLevel_m: number | null;
  groundwaterBasis: string;
  soilUnitWeight_kNm3: number;
  drainage: "drained" | "undrained" | "both";
  transientIncrease: "none" | "granted";
  transientFactor: number;
  accidentalFactor: number;
  neighbours: string;
  conditions: string;
  basis: "recommended" | "assumed" | "presumptive";
  confirmBy: string | null;
  confirmWho: string | null;
  purpose: "preliminary" | "for-design";
};

export type RevisionState = "checked" | "issued" | "superseded" | "withdrawn";
export type Signature = { personId: PersonId; name: string; qualification: string; at: string };

export type CitedSource = {
  documentRevisionId: DocumentRevisionId;
  documentId: DocumentId;
  reference: string;
  title: string;
  code: string;
  /** Code of the document's newer revision, when the one cited no longer counts. */
  supersededBy: string | null;
  /** The geotechnical engineer has said that the newer revision does not change the value. */
  confirmed: boolean;
  page: number | null;
  clause: string;
  note: string;
  holes: string[];
};

export type FieldDifference = {
  name: ValueFieldName | "sources";
  label: string;
  unit: string;
  before: string;
  after: string;
  /** Only between two numbers, of the earlier one. */
  change_percent: number | null;
};

export type ValueRevision = {
  id: ValueRevisionId;
  number: number;
  code: string;
  state: RevisionState;
  fields: StatedFields;
  sources: CitedSource[];
  reasonCode: string;
  reason: string;
  contentHash: string;
  prepared: Signature;
  checked: Signature;
  issued: Signature | null;
  withdrawn: (Signature & { reason: string }) | null;
  /** Against the revision before it; empty for the first. */
  differences: FieldDifference[];
};

export type ValueDraft = {
  content: DraftContent;
  preparedBy: { id: PersonId; name: string };
  revision: number;
  changedAt: string;
  /** What still stands in the way of a check, by field. */
  problems: Record<string, string>;
  findings: DraftFinding[];
  /** The net pressure the draft comes to, as far as it can be read. */
  netAllowable_kPa: number | null;
  /** Sources as they would be shown, in the draft's order. */
  sources: CitedSource[];
};

export type ValueState = "issued" | "checked" | "draft" | "withdrawn" | "empty";

export type ValueItem = {
  id: ValueId;
  reference: string;
  zone: { id: ZoneId; name: string };
  groundUnit: { id: GroundUnitId; code: string; name: string; soil: string };
  /** What counts: an issued revision in force; else the latest thing that was done to it. */
  state: ValueState;
  hasDraft: boolean;
  current: {
    code: string;
    netAllowable_kPa: number | null;
    basis: "recommended" | "assumed" | "presumptive";
    purpose: "preliminary" | "for-design";
    issuedAt: string;
    confirmBy: string | null;
    confirmWho: string | null;
  } | null;
  /** Footings linked to the value, and those whose last check stands on an earlier revision of it. */
  footings: { notPoured: number; poured: number; onEarlierRevision: number };
};
export type ValueList = { items: ValueItem[]; total: number };

export type ValueDetail = {
  id: ValueId;
  reference: string;
  revision: number;
  zone: { id: ZoneId; name: string };
  groundUnit: { id: GroundUnitId; code: string; name: string; soil: string };
  currentRevisionId: ValueRevisionId | null;
  draft: ValueDraft | null;
  revisions: ValueRevision[];
  footings: { notPoured: number; poured: number };
};

/** What is missing between ground and footings. Each list holds at most a hundred, its total beside it. */
export type Coverage = {
  footingsWithoutValue: Gap<{ id: string; mark: string }>;
  valuesWithoutFooting: Gap<{ id: ValueId; reference: string }>;
  zonesWithoutHole: Gap<{ id: ZoneId; name: string }>;
  unitsWithoutValue: Gap<{ id: GroundUnitId; code: string; name: string }>;
  footingsOnUnconfirmed: Gap<{ id: string; mark: string }>;
};
type Gap<Item> = { total: number; first: Item[] };

/** Places that have no value yet. */
export type NewValueChoices = {
  places: { zoneId: ZoneId; zone: string; groundUnitId: GroundUnitId; groundUnit: string }[];
};

/** Documents that a draft can cite, in their current revision. */
export type DraftChoices = {
  documents: {
    documentRevisionId: DocumentRevisionId;
    reference: string;
    title: string;
    code: string;
    pages: number | null;
  }[];
};
