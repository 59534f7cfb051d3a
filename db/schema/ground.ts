import {
  boolean,
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
  DocumentRevisionId,
  GroundUnitId,
  HoleId,
  HoleRevisionId,
  PersonId,
  StratumId,
} from "@/lib/contracts/ids";
import { id, moment, projectKey, quantity } from "./columns";
import { documentRevision } from "./documents";
import { person } from "./people";
import { project } from "./projects";

/** One delivery of digital ground data, accepted whole. Keeps what the file says of itself and every finding. */
export const dataIssue = pgTable(
  "data_issue",
  {
    projectId: projectKey().references(() => project.id),
    id: uuid("id").notNull().defaultRandom(),
    documentRevisionId: id<DocumentRevisionId>("document_revision_id"),
    fileName: text("file_name").notNull(),
    sha256: text("sha256").notNull(),
    edition: text("edition").notNull(),
    fileProjectId: text("file_project_id").notNull().default(""),
    fileProjectName: text("file_project_name").notNull().default(""),
    issueNumber: text("issue_number").notNull().default(""),
    issueDate: text("issue_date").notNull().default(""),
    dataStatus: text("data_status").notNull().default(""),
    producer: text("producer").notNull().default(""),
    findings: jsonb("findings").notNull(),
    /** Groups the register does not model, kept as they came: [{name, headings, rows}]. */
    otherGroups: jsonb("other_groups").notNull().default([]),
    importedBy: id<PersonId>("imported_by")
      .notNull()
      .references(() => person.id),
    importedAt: moment("imported_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({
      columns: [t.projectId, t.documentRevisionId],
      foreignColumns: [documentRevision.projectId, documentRevision.id],
    }),
  ],
);

/** An exploratory hole: its name and which revision of its log counts. */
export const hole = pgTable(
  "hole",
  {
    projectId: projectKey().references(() => project.id),
    id: id<HoleId>("id").notNull().defaultRandom(),
    name: text("name").notNull(),
    currentRevisionId: id<HoleRevisionId>("current_revision_id"),
    revision: integer("revision").notNull().default(1),
    createdAt: moment("created_at").notNull().defaultNow(),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.id] }), unique("hole_name").on(t.projectId, t.name)],
);

/** One revision of a hole's log. A corrected log is a new revision; strata, tests and water hang on it. */
export const holeRevision = pgTable(
  "hole_revision",
  {
    projectId: projectKey(),
    id: id<HoleRevisionId>("id").notNull().defaultRandom(),
    holeId: id<HoleId>("hole_id").notNull(),
    number: integer("number").notNull(),
    kind: text("kind").notNull(),
    /** PROPOSED, DRAFT, PRELIM, FINAL or HISTORIC, as the AGS data format lists them; empty when not stated. */
    status: text("status").notNull().default(""),
    easting_m: quantity("easting_m"),
    northing_m: quantity("northing_m"),
    /** What the source gave before it was brought to the site grid. */
    givenEasting_m: quantity("given_easting_m"),
    givenNorthing_m: quantity("given_northing_m"),
    givenGrid: text("given_grid").notNull().default(""),
    groundLevel_m: quantity("ground_level_m"),
    givenDatum: text("given_datum").notNull().default(""),
    finalDepth_m: quantity("final_depth_m"),
    startedOn: text("started_on").notNull().default(""),
    endedOn: text("ended_on").notNull().default(""),
    termination: text("termination").notNull().default(""),
    remarks: text("remarks").notNull().default(""),
    loggedBy: text("logged_by").notNull().default(""),
    dataIssueId: uuid("data_issue_id"),
    sourceLine: integer("source_line"),
    sourceRevisionId: id<DocumentRevisionId>("source_revision_id"),
    sourcePage: integer("source_page"),
    reason: text("reason").notNull().default(""),
    recordedBy: id<PersonId>("recorded_by")
      .notNull()
      .references(() => person.id),
    recordedAt: moment("recorded_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.holeId], foreignColumns: [hole.projectId, hole.id] }),
    foreignKey({
      columns: [t.projectId, t.dataIssueId],
      foreignColumns: [dataIssue.projectId, dataIssue.id],
    }),
    foreignKey({
      columns: [t.projectId, t.sourceRevisionId],
      foreignColumns: [documentRevision.projectId, documentRevision.id],
    }),
    unique("hole_revision_number").on(t.projectId, t.holeId, t.number),
  ],
);

/** A layer of the whole project that strata are assigned to. */
export const groundUnit = pgTable(
  "ground_unit",
  {
    projectId: projectKey().references(() => project.id),
    id: id<GroundUnitId>("id").notNull().defaultRandom(),
    code: text("code").notNull(),
    name: text("name").notNull(),
    description: text("description").notNull().default(""),
    /** Principal soil, which chooses the hatch: clay, silt, sand, gravel, peat, cobbles, made-ground, topsoil, rock kinds. */
    soil: text("soil").notNull(),
    /** Order from the surface down, for legends and sections. */
    position: integer("position").notNull().default(0),
    revision: integer("revision").notNull().default(1),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.id] }), unique("ground_unit_code").on(t.projectId, t.code)],
);

/** One described interval of one log. The description is verbatim and never rewritten. */
export const stratum = pgTable(
  "stratum",
  {
    projectId: projectKey(),
    id: id<StratumId>("id").notNull().defaultRandom(),
    holeRevisionId: id<HoleRevisionId>("hole_revision_id").notNull(),
    ordinal: integer("ordinal").notNull(),
    top_m: quantity("top_m").notNull(),
    base_m: quantity("base_m"),
    description: text("description").notNull(),
    legendCode: text("legend_code").notNull().default(""),
    geologyCode: text("geology_code").notNull().default(""),
    /** Machine-read from legend code and words; to be confirmed by the engineer. */
    soil: text("soil").notNull().default(""),
    madeGround: boolean("made_ground").notNull().default(false),
    sourceLine: integer("source_line"),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({
      columns: [t.projectId, t.holeRevisionId],
      foreignColumns: [holeRevision.projectId, holeRevision.id],
    }),
    unique("stratum_ordinal").on(t.projectId, t.holeRevisionId, t.ordinal),
  ],
);

/** Which ground unit a stratum belongs to: the engineer's reading, kept apart from the log and free to change. */
export const stratumAssignment = pgTable(
  "stratum_assignment",
  {
    projectId: projectKey(),
    stratumId: id<StratumId>("stratum_id").notNull(),
    groundUnitId: id<GroundUnitId>("ground_unit_id").notNull(),
    assignedBy: id<PersonId>("assigned_by")
      .notNull()
      .references(() => person.id),
    assignedAt: moment("assigned_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.stratumId] }),
    foreignKey({ columns: [t.projectId, t.stratumId], foreignColumns: [stratum.projectId, stratum.id] }),
    foreignKey({
      columns: [t.projectId, t.groundUnitId],
      foreignColumns: [groundUnit.projectId, groundUnit.id],
    }),
    index("stratum_assignment_unit").on(t.projectId, t.groundUnitId),
  ],
);

/** One standard penetration test. N, refusal ("50 for 215 mm") and the words of the log are three things. */
export const spt = pgTable(
  "spt",
  {
    projectId: projectKey(),
    holeRevisionId: id<HoleRevisionId>("hole_revision_id").notNull(),
    ordinal: integer("ordinal").notNull(),
    depth_m: quantity("depth_m").notNull(),
    kind: text("kind").notNull().default(""),
    blowCount: integer("blow_count"),
    refusal: boolean("refusal").notNull().default(false),
    mainBlows: integer("main_blows"),
    mainPenetration_mm: quantity("main_penetration_mm"),
    seatingBlows: integer("seating_blows"),
    increments: jsonb("increments").notNull().default([]),
    energyRatio_percent: quantity("energy_ratio_percent"),
    reportText: text("report_text").notNull().default(""),
    waterText: text("water_text").notNull().default(""),
    casing_m: quantity("casing_m"),
    sourceLine: integer("source_line"),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.holeRevisionId, t.ordinal] }),
    foreignKey({
      columns: [t.projectId, t.holeRevisionId],
      foreignColumns: [holeRevision.projectId, holeRevision.id],
    }),
  ],
);

/** A water strike while boring, with its rises by minutes. Text readings such as "Dry" stay text. */
export const waterStrike = pgTable(
  "water_strike",
  {
    projectId: projectKey(),
    holeRevisionId: id<HoleRevisionId>("hole_revision_id").notNull(),
    ordinal: integer("ordinal").notNull(),
    depth_m: quantity("depth_m").notNull(),
    at: text("at").notNull().default(""),
    casing_m: quantity("casing_m"),
    sealed_m: quantity("sealed_m"),
    rises: jsonb("rises")
      .$type<{ minutes: number; depth_m: number | null; text: string }[]>()
      .notNull()
      .default([]),
    remarks: text("remarks").notNull().default(""),
    sourceLine: integer("source_line"),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.holeRevisionId, t.ordinal] }),
    foreignKey({
      columns: [t.projectId, t.holeRevisionId],
      foreignColumns: [holeRevision.projectId, holeRevision.id],
    }),
  ],
);
