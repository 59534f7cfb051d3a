import { foreignKey, integer, jsonb, pgTable, primaryKey, text, unique } from "drizzle-orm/pg-core";
import type { GroundUnitId, PersonId, ZoneId, ZoneRevisionId } from "@/lib/contracts/ids";
import { id, moment, projectKey } from "./columns";
import { groundUnit } from "./ground";
import { person } from "./people";
import { project } from "./projects";

/** An area on plan in which one set of values applies. */
export const zone = pgTable(
  "zone",
  {
    projectId: projectKey().references(() => project.id),
    id: id<ZoneId>("id").notNull().defaultRandom(),
    name: text("name").notNull(),
    currentRevisionId: id<ZoneRevisionId>("current_revision_id"),
    revision: integer("revision").notNull().default(1),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.id] }), unique("zone_name").on(t.projectId, t.name)],
);

/** The ground units that a zone speaks for. Zones that share one may not overlap on plan. */
export const zoneGroundUnit = pgTable(
  "zone_ground_unit",
  {
    projectId: projectKey(),
    zoneId: id<ZoneId>("zone_id").notNull(),
    groundUnitId: id<GroundUnitId>("ground_unit_id").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.zoneId, t.groundUnitId] }),
    foreignKey({ columns: [t.projectId, t.zoneId], foreignColumns: [zone.projectId, zone.id] }),
    foreignKey({
      columns: [t.projectId, t.groundUnitId],
      foreignColumns: [groundUnit.projectId, groundUnit.id],
    }),
  ],
);

/** One drawn boundary of a zone. Redrawing makes another. */
export const zoneRevision = pgTable(
  "zone_revision",
  {
    projectId: projectKey(),
    id: id<ZoneRevisionId>("id").notNull().defaultRandom(),
    zoneId: id<ZoneId>("zone_id").notNull(),
    number: integer("number").notNull(),
    /** Outer ring on the site grid: [[easting_m, northing_m], …], not closed, anticlockwise. */
    ring_m: jsonb("ring_m").$type<[number, number][]>().notNull(),
    /** How well the boundary is known: proved, interpolated or inferred. */
    boundary: text("boundary").notNull().default("interpolated"),
    reason: text("reason").notNull().default(""),
    drawnBy: id<PersonId>("drawn_by")
      .notNull()
      .references(() => person.id),
    drawnAt: moment("drawn_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.zoneId], foreignColumns: [zone.projectId, zone.id] }),
    unique("zone_revision_number").on(t.projectId, t.zoneId, t.number),
  ],
);
