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
  CheckId,
  DocumentRevisionId,
  FootingId,
  FootingRevisionId,
  LoadSetId,
  PersonId,
  ValueId,
} from "@/lib/contracts/ids";
import { id, moment, projectKey, quantity } from "./columns";
import { person } from "./people";
import { project } from "./projects";
import { bearingValue } from "./values";

/** Stages of a footing on site, in order. */
export type Stage = "designed" | "issued" | "excavated" | "formation-accepted" | "poured";

/** A pad footing: its mark, and pointers to the geometry, loads, value and check that count now. */
export const footing = pgTable(
  "footing",
  {
    projectId: projectKey().references(() => project.id),
    id: id<FootingId>("id").notNull().defaultRandom(),
    mark: text("mark").notNull(),
    gridReference: text("grid_reference").notNull().default(""),
    ownerId: id<PersonId>("owner_id").references(() => person.id),
    stage: text("stage").$type<Stage>().notNull().default("designed"),
    currentRevisionId: id<FootingRevisionId>("current_revision_id"),
    currentLoadSetId: id<LoadSetId>("current_load_set_id"),
    /** The value that the engineer has linked; how and why stands in the link's own row. */
    valueId: id<ValueId>("value_id"),
    latestCheckId: id<CheckId>("latest_check_id"),
    revision: integer("revision").notNull().default(1),
    createdAt: moment("created_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    unique("footing_mark").on(t.projectId, t.mark),
    foreignKey({
      columns: [t.projectId, t.valueId],
      foreignColumns: [bearingValue.projectId, bearingValue.id],
    }),
    index("footing_value").on(t.projectId, t.valueId),
  ],
);

/** One revision of a footing's position and size. */
export const footingRevision = pgTable(
  "footing_revision",
  {
    projectId: projectKey(),
    id: id<FootingRevisionId>("id").notNull().defaultRandom(),
    footingId: id<FootingId>("footing_id").notNull(),
    number: integer("number").notNull(),
    easting_m: quantity("easting_m").notNull(),
    northing_m: quantity("northing_m").notNull(),
    /** Bearing of the breadth axis, anticlockwise from grid east. */
    orientation_deg: quantity("orientation_deg").notNull().default(0),
    breadth_m: quantity("breadth_m").notNull(),
    length_m: quantity("length_m").notNull(),
    thickness_m: quantity("thickness_m").notNull(),
    groundLevel_m: quantity("ground_level_m").notNull(),
    foundingLevel_m: quantity("founding_level_m").notNull(),
    loadHeight_m: quantity("load_height_m").notNull(),
    concreteUnitWeight_kNm3: quantity("concrete_unit_weight_knm3").notNull().default(24),
    backfillUnitWeight_kNm3: quantity("backfill_unit_weight_knm3").notNull().default(18),
    note: text("note").notNull().default(""),
    sourceRevisionId: id<DocumentRevisionId>("source_revision_id"),
    recordedBy: id<PersonId>("recorded_by")
      .notNull()
      .references(() => person.id),
    recordedAt: moment("recorded_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
    unique("footing_revision_number").on(t.projectId, t.footingId, t.number),
    check(
      "sizes_are_positive",
      sql`${t.breadth_m} > 0 and ${t.length_m} > 0 and ${t.thickness_m} > 0
        and ${t.breadth_m} < 'Infinity' and ${t.length_m} < 'Infinity' and ${t.thickness_m} < 'Infinity'`,
    ),
    check("founded_below_ground", sql`${t.foundingLevel_m} <= ${t.groundLevel_m}`),
  ],
);

/** One issue of a footing's load combinations, at the column base, service level. */
export const loadSet = pgTable(
  "load_set",
  {
    projectId: projectKey(),
    id: id<LoadSetId>("id").notNull().defaultRandom(),
    footingId: id<FootingId>("footing_id").notNull(),
    number: integer("number").notNull(),
    /** As the contract `loadCombination` has it; one array, read and written whole. */
    combinations: jsonb("combinations").notNull(),
    /** The basis of the loads, to be the same as the value's: characteristic-full, characteristic-reduced, design-factored. */
    loadBasis: text("load_basis").notNull(),
    source: text("source").notNull().default(""),
    sourceRevisionId: id<DocumentRevisionId>("source_revision_id"),
    recordedBy: id<PersonId>("recorded_by")
      .notNull()
      .references(() => person.id),
    recordedAt: moment("recorded_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
    unique("load_set_number").on(t.projectId, t.footingId, t.number),
  ],
);

/** The history of which value a footing was linked to: suggested by its zone or chosen with a reason. */
export const footingLink = pgTable(
  "footing_link",
  {
    projectId: projectKey(),
    footingId: id<FootingId>("footing_id").notNull(),
    number: integer("number").notNull(),
    /** Null records that the link was taken away. */
    valueId: id<ValueId>("value_id"),
    how: text("how").$type<"from-zone" | "chosen" | "removed">().notNull(),
    reason: text("reason").notNull().default(""),
    linkedBy: id<PersonId>("linked_by")
      .notNull()
      .references(() => person.id),
    linkedAt: moment("linked_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.footingId, t.number] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
    foreignKey({
      columns: [t.projectId, t.valueId],
      foreignColumns: [bearingValue.projectId, bearingValue.id],
    }),
  ],
);

/** When a footing reached a stage on site, and who said so. */
export const stageEvent = pgTable(
  "stage_event",
  {
    projectId: projectKey(),
    footingId: id<FootingId>("footing_id").notNull(),
    number: integer("number").notNull(),
    stage: text("stage").$type<Stage>().notNull(),
    reachedOn: text("reached_on").notNull(),
    note: text("note").notNull().default(""),
    recordedBy: id<PersonId>("recorded_by")
      .notNull()
      .references(() => person.id),
    recordedAt: moment("recorded_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.footingId, t.number] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
  ],
);
