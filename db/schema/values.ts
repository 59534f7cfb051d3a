import { sql } from "drizzle-orm";
import {
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
} from "drizzle-orm/pg-core";
import type {
  DocumentRevisionId,
  GroundUnitId,
  PersonId,
  ValueId,
  ValueRevisionId,
  ZoneId,
} from "@/lib/contracts/ids";
import { id, moment, projectKey, quantity } from "./columns";
import { documentRevision } from "./documents";
import { person } from "./people";
import { zoneGroundUnit } from "./zones";

/** The register's entry for one ground unit in one zone. Which revision is in force is one pointer. */
export const bearingValue = pgTable(
  "bearing_value",
  {
    projectId: projectKey(),
    id: id<ValueId>("id").notNull().defaultRandom(),
    reference: text("reference").notNull(),
    zoneId: id<ZoneId>("zone_id").notNull(),
    groundUnitId: id<GroundUnitId>("ground_unit_id").notNull(),
    /** The issued revision in force; null before the first issue and after a withdrawal. */
    currentRevisionId: id<ValueRevisionId>("current_revision_id"),
    revision: integer("revision").notNull().default(1),
    createdAt: moment("created_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    unique("bearing_value_reference").on(t.projectId, t.reference),
    unique("bearing_value_place").on(t.projectId, t.zoneId, t.groundUnitId),
    foreignKey({
      columns: [t.projectId, t.zoneId, t.groundUnitId],
      foreignColumns: [zoneGroundUnit.projectId, zoneGroundUnit.zoneId, zoneGroundUnit.groundUnitId],
    }),
  ],
);

/** The revision being written: free to change until a second person checks it. One a value. */
export const bearingValueDraft = pgTable(
  "bearing_value_draft",
  {
    projectId: projectKey(),
    valueId: id<ValueId>("value_id").notNull(),
    /** Fields of the revision as typed so far, with its sources; may be incomplete. */
    content: jsonb("content").notNull(),
    preparedBy: id<PersonId>("prepared_by")
      .notNull()
      .references(() => person.id),
    revision: integer("revision").notNull().default(1),
    changedAt: moment("changed_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.valueId] }),
    foreignKey({
      columns: [t.projectId, t.valueId],
      foreignColumns: [bearingValue.projectId, bearingValue.id],
    }),
  ],
);

/** A checked revision: everything needed to use the value safely. Never changes. Its state is derived. */
export const bearingValueRevision = pgTable(
  "bearing_value_revision",
  {
    projectId: projectKey(),
    id: id<ValueRevisionId>("id").notNull().defaultRandom(),
    valueId: id<ValueId>("value_id").notNull(),
    number: integer("number").notNull(),
    code: text("code").notNull(),
    kind: text("kind").$type<"single" | "table" | "parameters">().notNull(),
    netAllowable_kPa: quantity("net_allowable_kpa"),
    table: jsonb("value_table"),
    parameters: jsonb("parameters"),
    /** What the report says, before it was brought to net: basis, number as typed, its unit and the factor used. */
    givenBasis: text("given_basis").$type<"net" | "gross">().notNull(),
    given: text("given").notNull(),
    given_kPa: quantity("given_kpa"),
    givenOverburden_kPa: quantity("given_overburden_kpa"),
    factorConvention: text("factor_convention")
      .$type<"net-over-factor" | "gross-over-factor" | "not-stated">()
      .notNull(),
    factorOfSafety: quantity("factor_of_safety"),
    comparedWith: text("compared_with").$type<"maximum" | "effective-area">().notNull(),
    loadBasis: text("load_basis")
      .$type<"characteristic-full" | "characteristic-reduced" | "design-factored">()
      .notNull(),
    governedBy: text("governed_by").$type<"strength" | "settlement" | "not-stated">().notNull(),
    settlementLimit_mm: quantity("settlement_limit_mm"),
    settlementPredicted_mm: quantity("settlement_predicted_mm"),
    minBreadth_m: quantity("min_breadth_m"),
    maxBreadth_m: quantity("max_breadth_m"),
    minFoundingDepth_m: quantity("min_founding_depth_m"),
    highestFoundingLevel_m: quantity("highest_founding_level_m"),
    lowestFoundingLevel_m: quantity("lowest_founding_level_m"),
    groundwaterLevel_m: quantity("groundwater_level_m"),
    groundwaterBasis: text("groundwater_basis").notNull(),
    soilUnitWeight_kNm3: quantity("soil_unit_weight_knm3").notNull(),
    drainage: text("drainage").$type<"drained" | "undrained" | "both">().notNull(),
    transientIncrease: text("transient_increase").$type<"none" | "granted">().notNull(),
    transientFactor: quantity("transient_factor").notNull(),
    accidentalFactor: quantity("accidental_factor").notNull(),
    neighbours: text("neighbours").notNull().default(""),
    conditions: text("conditions").notNull().default(""),
    /** Recommended by a report, assumed before investigation, or presumed from a code's table. */
    basis: text("basis").$type<"recommended" | "assumed" | "presumptive">().notNull(),
    confirmBy: text("confirm_by"),
    confirmWho: text("confirm_who"),
    purpose: text("purpose").$type<"preliminary" | "for-design">().notNull(),
    derivation: jsonb("derivation"),
    reasonCode: text("reason_code").notNull(),
    reason: text("reason").notNull(),
    preparedBy: id<PersonId>("prepared_by")
      .notNull()
      .references(() => person.id),
    preparedAt: moment("prepared_at").notNull(),
    checkedBy: id<PersonId>("checked_by")
      .notNull()
      .references(() => person.id),
    checkedAt: moment("checked_at").notNull().defaultNow(),
    /** SHA-256 of the canonical content that both signatures stand under. */
    contentHash: text("content_hash").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({
      columns: [t.projectId, t.valueId],
      foreignColumns: [bearingValue.projectId, bearingValue.id],
    }),
    unique("bearing_value_revision_number").on(t.projectId, t.valueId, t.number),
    unique("bearing_value_revision_of_value").on(t.projectId, t.valueId, t.id),
    // A check copies kind and pressure through these keys, so it can hold no number that the revision does not.
    unique("bearing_value_revision_kind").on(t.projectId, t.id, t.kind),
    unique("bearing_value_revision_pressure").on(t.projectId, t.id, t.netAllowable_kPa),
    unique("bearing_value_revision_signed").on(t.projectId, t.id, t.preparedBy, t.checkedBy),
    check("checked_by_another", sql`${t.checkedBy} <> ${t.preparedBy}`),
    check(
      "one_kind_of_value",
      sql`(${t.kind} = 'single') = (${t.netAllowable_kPa} is not null)
        and (${t.kind} = 'table') = (${t.table} is not null)
        and (${t.kind} = 'parameters') = (${t.parameters} is not null)`,
    ),
    check(
      "pressure_is_a_number",
      sql`${t.netAllowable_kPa} is null or (${t.netAllowable_kPa} > 0 and ${t.netAllowable_kPa} < 'Infinity')`,
    ),
  ],
);

/** The evidence a revision rests on: a page of a document revision, and the holes that it names. */
export const valueSource = pgTable(
  "value_source",
  {
    projectId: projectKey(),
    valueRevisionId: id<ValueRevisionId>("value_revision_id").notNull(),
    ordinal: integer("ordinal").notNull(),
    documentRevisionId: id<DocumentRevisionId>("document_revision_id").notNull(),
    page: integer("page"),
    clause: text("clause").notNull().default(""),
    note: text("note").notNull().default(""),
    holes: text("holes").array().notNull().default([]),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.valueRevisionId, t.ordinal] }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId],
      foreignColumns: [bearingValueRevision.projectId, bearingValueRevision.id],
    }),
    foreignKey({
      columns: [t.projectId, t.documentRevisionId],
      foreignColumns: [documentRevision.projectId, documentRevision.id],
    }),
    index("value_source_document").on(t.projectId, t.documentRevisionId),
  ],
);

/** The act of issuing a checked revision. Only an issued revision can stand under a check. */
export const revisionIssue = pgTable(
  "revision_issue",
  {
    projectId: projectKey(),
    valueRevisionId: id<ValueRevisionId>("value_revision_id").notNull(),
    valueId: id<ValueId>("value_id").notNull(),
    preparedBy: id<PersonId>("prepared_by").notNull(),
    checkedBy: id<PersonId>("checked_by").notNull(),
    issuedBy: id<PersonId>("issued_by")
      .notNull()
      .references(() => person.id),
    issuedAt: moment("issued_at").notNull().defaultNow(),
    replaces: id<ValueRevisionId>("replaces"),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.valueRevisionId] }),
    foreignKey({
      columns: [t.projectId, t.valueId, t.valueRevisionId],
      foreignColumns: [bearingValueRevision.projectId, bearingValueRevision.valueId, bearingValueRevision.id],
    }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId, t.preparedBy, t.checkedBy],
      foreignColumns: [
        bearingValueRevision.projectId,
        bearingValueRevision.id,
        bearingValueRevision.preparedBy,
        bearingValueRevision.checkedBy,
      ],
    }),
    check("issued_by_a_third", sql`${t.issuedBy} <> ${t.preparedBy} and ${t.issuedBy} <> ${t.checkedBy}`),
  ],
);

/** The act of taking an issued revision out of use. */
export const revisionWithdrawal = pgTable(
  "revision_withdrawal",
  {
    projectId: projectKey(),
    valueRevisionId: id<ValueRevisionId>("value_revision_id").notNull(),
    reason: text("reason").notNull(),
    withdrawnBy: id<PersonId>("withdrawn_by")
      .notNull()
      .references(() => person.id),
    withdrawnAt: moment("withdrawn_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.valueRevisionId] }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId],
      foreignColumns: [revisionIssue.projectId, revisionIssue.valueRevisionId],
    }),
  ],
);

/** The geotechnical engineer's word that a newer revision of a source does not change the value. */
export const sourceConfirmation = pgTable(
  "source_confirmation",
  {
    projectId: projectKey(),
    valueRevisionId: id<ValueRevisionId>("value_revision_id").notNull(),
    documentRevisionId: id<DocumentRevisionId>("document_revision_id").notNull(),
    reason: text("reason").notNull(),
    confirmedBy: id<PersonId>("confirmed_by")
      .notNull()
      .references(() => person.id),
    confirmedAt: moment("confirmed_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.valueRevisionId, t.documentRevisionId] }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId],
      foreignColumns: [bearingValueRevision.projectId, bearingValueRevision.id],
    }),
    foreignKey({
      columns: [t.projectId, t.documentRevisionId],
      foreignColumns: [documentRevision.projectId, documentRevision.id],
    }),
  ],
);
