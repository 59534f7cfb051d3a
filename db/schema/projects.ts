import { boolean, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from "drizzle-orm/pg-core";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { id, moment, projectKey, quantity } from "./columns";
import { person } from "./people";

/** One site with one site grid and one vertical datum. */
export const project = pgTable("project", {
  id: id<ProjectId>("id").primaryKey().defaultRandom(),
  number: text("number").notNull().unique(),
  title: text("title").notNull(),
  client: text("client").notNull().default(""),
  gridName: text("grid_name").notNull(),
  /** EPSG code of the national grid that the site grid is tied to; null when the site grid stands alone. */
  epsgCode: integer("epsg_code"),
  gridOriginEasting_m: quantity("grid_origin_easting_m").notNull().default(0),
  gridOriginNorthing_m: quantity("grid_origin_northing_m").notNull().default(0),
  gridRotation_deg: quantity("grid_rotation_deg").notNull().default(0),
  gridScale: quantity("grid_scale").notNull().default(1),
  datumName: text("datum_name").notNull(),
  /** Shown beside every level: the structure's level zero on the project's datum. */
  structuralZero_m: quantity("structural_zero_m"),
  unitSystem: text("unit_system").$type<"si" | "kip-ft" | "tonne-metre">().notNull().default("si"),
  reportingStandard: text("reporting_standard").notNull().default(""),
  currentCriteria: integer("current_criteria").notNull().default(1),
  sitePlan: jsonb("site_plan").$type<SitePlan>(),
  revision: integer("revision").notNull().default(1),
  createdAt: moment("created_at").notNull().defaultNow(),
});

/** A site-plan image (a document revision) placed by two points known in image pixels and on the site grid. */
export type SitePlan = {
  documentRevisionId: string;
  width_px: number;
  height_px: number;
  points: { x_px: number; y_px: number; easting_m: number; northing_m: number }[];
};

/** Who holds which role in a project. A person may hold several. */
export const membership = pgTable(
  "membership",
  {
    projectId: projectKey().references(() => project.id),
    personId: id<PersonId>("person_id")
      .notNull()
      .references(() => person.id),
    role: text("role").$type<"geotechnical" | "structural" | "lead" | "reader">().notNull(),
    grantedAt: moment("granted_at").notNull().defaultNow(),
    grantedBy: id<PersonId>("granted_by").references(() => person.id),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.personId, t.role] })],
);

/** Factors of safety and contact limits that checks answer to; each change is a new number, none is overwritten. */
export const criteria = pgTable(
  "criteria",
  {
    projectId: projectKey().references(() => project.id),
    number: integer("number").notNull(),
    slidingFactor: quantity("sliding_factor").notNull(),
    overturningFactor: quantity("overturning_factor").notNull(),
    upliftFactor: quantity("uplift_factor").notNull(),
    interfaceAngle_deg: quantity("interface_angle_deg").notNull(),
    adhesion_kPa: quantity("adhesion_kpa").notNull(),
    permanentWithinMiddleThird: boolean("permanent_within_middle_third").notNull(),
    transientMinContactRatio: quantity("transient_min_contact_ratio").notNull(),
    accidentalMinContactRatio: quantity("accidental_min_contact_ratio").notNull(),
    /** A hole farther than this from a footing does not speak for the ground under it. */
    nearestHoleLimit_m: quantity("nearest_hole_limit_m").notNull().default(25),
    reason: text("reason").notNull(),
    setBy: id<PersonId>("set_by")
      .notNull()
      .references(() => person.id),
    setAt: moment("set_at").notNull().defaultNow(),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.number] })],
);

/** A personal token for scripts: scoped, expiring, shown once, stored as a hash. */
export const apiToken = pgTable(
  "api_token",
  {
    projectId: projectKey().references(() => project.id),
    id: uuid("id").notNull().defaultRandom(),
    personId: id<PersonId>("person_id")
      .notNull()
      .references(() => person.id),
    name: text("name").notNull(),
    scopes: text("scopes").array().notNull(),
    tokenHash: text("token_hash").notNull(),
    createdAt: moment("created_at").notNull().defaultNow(),
    expiresAt: moment("expires_at").notNull(),
    lastUsedAt: moment("last_used_at"),
    revokedAt: moment("revoked_at"),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    unique("api_token_hash").on(t.projectId, t.tokenHash),
  ],
);
