import { z } from "zod";
import type { GroundUnitId, ZoneId, ZoneRevisionId } from "./ids";
import { plainText } from "./plain-text";

const uuid = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);

export const boundaries = ["proved", "interpolated", "inferred"] as const;
export type Boundary = (typeof boundaries)[number];

const coordinate = z.number("A coordinate is a finite number of metres.").min(-1e8).max(1e8);
const ring_m = z
  .array(z.tuple([coordinate, coordinate]))
  .min(3, "A boundary needs at least three corners.")
  .max(2000, "A boundary takes at most 2,000 corners.");
const name = plainText(80)
  .transform((text) => text.trim())
  .refine((text) => text !== "", "The zone needs a name.");
const groundUnitIds = z
  .array(uuid<GroundUnitId>())
  .min(1, "Choose the ground units that the zone speaks for.")
  .max(50);
const boundary = z.enum(boundaries, {
  error: "Say how well the boundary is known: proved, interpolated or inferred.",
});

export const createZoneInput = z.strictObject({
  name,
  groundUnitIds,
  ring_m,
  boundary,
  reason: plainText(1000).default(""),
});
/** Redraws the boundary, renames the zone or changes its units; what is left out stays. */
export const changeZoneInput = z.strictObject({
  zoneId: uuid<ZoneId>(),
  revision: z.int(),
  name: name.optional(),
  groundUnitIds: groundUnitIds.optional(),
  ring_m: ring_m.optional(),
  boundary: boundary.optional(),
  reason: plainText(1000).default(""),
});
export type CreateZoneInput = z.input<typeof createZoneInput>;
export type ChangeZoneInput = z.input<typeof changeZoneInput>;

export type ZoneRow = {
  id: ZoneId;
  revision: number;
  name: string;
  revisionId: ZoneRevisionId;
  number: number;
  ring_m: [number, number][];
  boundary: Boundary;
  groundUnitIds: GroundUnitId[];
  /** Entries of the register in this zone, with the net pressure in force. */
  values: {
    id: string;
    reference: string;
    groundUnit: string;
    code: string | null;
    netAllowable_kPa: number | null;
  }[];
};
