import { sql } from "drizzle-orm";
import {
  bigint,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type {
  ChangeId,
  CheckId,
  ConsequenceId,
  FootingId,
  FootingRevisionId,
  HoleRevisionId,
  LoadSetId,
  PersonId,
  ValueId,
  ValueRevisionId,
  ZoneRevisionId,
} from "@/lib/contracts/ids";
import { id, moment, projectKey, quantity } from "./columns";
import { footing, footingRevision, loadSet } from "./footings";
import { person } from "./people";
import { criteria, project } from "./projects";
import { bearingValueRevision, revisionIssue } from "./values";
import { zoneRevision } from "./zones";

export type Verdict = "passes" | "fails" | "outside conditions";

/** One immutable record of one footing checked against one bearing value revision, pinned to all that it used. */
export const footingCheck = pgTable(
  "footing_check",
  {
    projectId: projectKey(),
    id: id<CheckId>("id").notNull().defaultRandom(),
    seq: bigint("seq", { mode: "number" }).notNull().generatedAlwaysAsIdentity(),
    footingId: id<FootingId>("footing_id").notNull(),
    footingRevisionId: id<FootingRevisionId>("footing_revision_id").notNull(),
    loadSetId: id<LoadSetId>("load_set_id").notNull(),
    valueId: id<ValueId>("value_id").notNull(),
    valueRevisionId: id<ValueRevisionId>("value_revision_id").notNull(),
    valueKind: text("value_kind").$type<"single" | "table" | "parameters">().notNull(),
    /** The pinned revision's own pressure: a foreign key holds it, nobody can type it. */
    netAllowable_kPa: quantity("net_allowable_kpa"),
    criteriaNumber: integer("criteria_number").notNull(),
    zoneRevisionId: id<ZoneRevisionId>("zone_revision_id").notNull(),
    holeRevisionIds: uuid("hole_revision_ids").array().$type<HoleRevisionId[]>().notNull().default([]),
    engineVersion: text("engine_version").notNull(),
    verdict: text("verdict").$type<Verdict>().notNull(),
    utilisation: quantity("utilisation"),
    utilisationBearing: quantity("utilisation_bearing"),
    requiredNet_kPa: quantity("required_net_kpa"),
    maxPressure_kPa: quantity("max_pressure_kpa"),
    minContactRatio: quantity("min_contact_ratio"),
    factorSliding: quantity("factor_sliding"),
    factorOverturning: quantity("factor_overturning"),
    factorUplift: quantity("factor_uplift"),
    governingCombination: text("governing_combination").notNull().default(""),
    /** Exactly what the check was given; `npm run replay` recomputes the result from it. */
    snapshot: jsonb("snapshot").notNull(),
    result: jsonb("result").notNull(),
    runBy: id<PersonId>("run_by")
      .notNull()
      .references(() => person.id),
    runAt: moment("run_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
    foreignKey({
      columns: [t.projectId, t.footingRevisionId],
      foreignColumns: [footingRevision.projectId, footingRevision.id],
    }),
    foreignKey({ columns: [t.projectId, t.loadSetId], foreignColumns: [loadSet.projectId, loadSet.id] }),
    foreignKey({
      columns: [t.projectId, t.zoneRevisionId],
      foreignColumns: [zoneRevision.projectId, zoneRevision.id],
    }),
    foreignKey({
      columns: [t.projectId, t.criteriaNumber],
      foreignColumns: [criteria.projectId, criteria.number],
    }),
    foreignKey({
      columns: [t.projectId, t.valueId, t.valueRevisionId],
      foreignColumns: [bearingValueRevision.projectId, bearingValueRevision.valueId, bearingValueRevision.id],
    }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId],
      foreignColumns: [revisionIssue.projectId, revisionIssue.valueRevisionId],
    }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId, t.valueKind],
      foreignColumns: [bearingValueRevision.projectId, bearingValueRevision.id, bearingValueRevision.kind],
    }),
    foreignKey({
      columns: [t.projectId, t.valueRevisionId, t.netAllowable_kPa],
      foreignColumns: [
        bearingValueRevision.projectId,
        bearingValueRevision.id,
        bearingValueRevision.netAllowable_kPa,
      ],
    }),
    check(
      "pressure_comes_from_the_revision",
      sql`(${t.valueKind} = 'single') = (${t.netAllowable_kPa} is not null)`,
    ),
    index("footing_check_history").on(t.projectId, t.footingId, t.seq),
    index("footing_check_value_required").on(t.projectId, t.valueId, t.requiredNet_kPa),
  ],
);

/** Kinds of change upstream of a check. */
export type ChangeKind =
  | "value-issued"
  | "value-withdrawn"
  | "document-superseded"
  | "hole-revised"
  | "zone-redrawn"
  | "unit-reassigned"
  | "criteria-changed"
  | "loads-changed"
  | "footing-changed"
  | "inspection-other-ground";

/** One change that may touch checks: what, from what to what, why, who, when. Closed when every consequence is answered. */
export const change = pgTable(
  "change",
  {
    projectId: projectKey().references(() => project.id),
    id: id<ChangeId>("id").notNull().defaultRandom(),
    seq: bigint("seq", { mode: "number" }).notNull().generatedAlwaysAsIdentity(),
    kind: text("kind").$type<ChangeKind>().notNull(),
    subjectId: uuid("subject_id").notNull(),
    /** The sentence shown for it: "BV-03 Terrace gravel, Zone B: P02 → P03, 250 → 200 kPa net". */
    title: text("title").notNull(),
    reason: text("reason").notNull(),
    valueId: id<ValueId>("value_id"),
    fromRevisionId: uuid("from_revision_id"),
    toRevisionId: uuid("to_revision_id"),
    /** Consequences by outcome, counted once when they were written. */
    counts: jsonb("counts").$type<Record<string, number>>().notNull().default({}),
    madeBy: id<PersonId>("made_by")
      .notNull()
      .references(() => person.id),
    madeAt: moment("made_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    index("change_order").on(t.projectId, t.seq),
    index("change_value").on(t.projectId, t.valueId),
  ],
);

export type Outcome = "holds" | "now fails" | "still fails" | "recovers" | "outside conditions";

/** What a change did to one linked footing: the last check before it, and the same check with what is new. */
export const consequence = pgTable(
  "consequence",
  {
    projectId: projectKey(),
    id: id<ConsequenceId>("id").notNull().defaultRandom(),
    changeId: id<ChangeId>("change_id").notNull(),
    footingId: id<FootingId>("footing_id").notNull(),
    checkId: id<CheckId>("check_id"),
    outcome: text("outcome").$type<Outcome>().notNull(),
    verdictBefore: text("verdict_before").$type<Verdict>(),
    verdictAfter: text("verdict_after").$type<Verdict>().notNull(),
    utilisationBefore: quantity("utilisation_before"),
    utilisationAfter: quantity("utilisation_after"),
    requiredNet_kPa: quantity("required_net_kpa"),
    stage: text("stage").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.changeId], foreignColumns: [change.projectId, change.id] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
    unique("consequence_once").on(t.projectId, t.changeId, t.footingId),
    index("consequence_footing").on(t.projectId, t.footingId),
  ],
);

export type DispositionKind = "re-checked" | "resized" | "accepted-as-built" | "referred-back";

/** The engineer's answer to a consequence. */
export const disposition = pgTable(
  "disposition",
  {
    projectId: projectKey(),
    consequenceId: id<ConsequenceId>("consequence_id").notNull(),
    number: integer("number").notNull(),
    kind: text("kind").$type<DispositionKind>().notNull(),
    reason: text("reason").notNull().default(""),
    checkId: id<CheckId>("check_id"),
    answeredBy: id<PersonId>("answered_by")
      .notNull()
      .references(() => person.id),
    answeredAt: moment("answered_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.consequenceId, t.number] }),
    foreignKey({
      columns: [t.projectId, t.consequenceId],
      foreignColumns: [consequence.projectId, consequence.id],
    }),
    foreignKey({
      columns: [t.projectId, t.checkId],
      foreignColumns: [footingCheck.projectId, footingCheck.id],
    }),
  ],
);

/** The project lead's word that a change is fully answered. */
export const changeClosure = pgTable(
  "change_closure",
  {
    projectId: projectKey(),
    changeId: id<ChangeId>("change_id").notNull(),
    note: text("note").notNull().default(""),
    closedBy: id<PersonId>("closed_by")
      .notNull()
      .references(() => person.id),
    closedAt: moment("closed_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.changeId] }),
    foreignKey({ columns: [t.projectId, t.changeId], foreignColumns: [change.projectId, change.id] }),
  ],
);
