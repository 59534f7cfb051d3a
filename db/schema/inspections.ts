import { bigint, boolean, foreignKey, index, jsonb, pgTable, primaryKey, text } from "drizzle-orm/pg-core";
import type { FootingId, GroundUnitId, InspectionId, PersonId } from "@/lib/contracts/ids";
import { id, moment, projectKey, quantity } from "./columns";
import { footing } from "./footings";
import { groundUnit } from "./ground";
import { person } from "./people";

/** The site record of the ground actually found at founding level. Never changes; a second look is a second record. */
export const inspection = pgTable(
  "inspection",
  {
    projectId: projectKey(),
    id: id<InspectionId>("id").notNull().defaultRandom(),
    seq: bigint("seq", { mode: "number" }).notNull().generatedAlwaysAsIdentity(),
    footingId: id<FootingId>("footing_id").notNull(),
    levelReached_m: quantity("level_reached_m"),
    /** The unit seen; null when it fits none of the project's units. */
    groundUnitId: id<GroundUnitId>("ground_unit_id"),
    asExpected: boolean("as_expected").notNull(),
    description: text("description").notNull(),
    water: text("water").notNull().default(""),
    softSpots: text("soft_spots").notNull().default(""),
    tests: jsonb("tests").notNull().default([]),
    photographs: jsonb("photographs").notNull().default([]),
    accepted: boolean("accepted").notNull(),
    conditions: text("conditions").notNull().default(""),
    validHours: quantity("valid_hours"),
    inspectedAt: moment("inspected_at").notNull(),
    inspectedBy: id<PersonId>("inspected_by")
      .notNull()
      .references(() => person.id),
    recordedAt: moment("recorded_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.footingId], foreignColumns: [footing.projectId, footing.id] }),
    foreignKey({
      columns: [t.projectId, t.groundUnitId],
      foreignColumns: [groundUnit.projectId, groundUnit.id],
    }),
    index("inspection_footing").on(t.projectId, t.footingId, t.seq),
  ],
);
