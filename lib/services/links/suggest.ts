import type { LinkCandidate, LinkSuggestion } from "@/lib/contracts/footings";
import type { FootingId, GroundUnitId, ValueId, ZoneId } from "@/lib/contracts/ids";
import { shareInside } from "@/lib/geometry/overlap";
import type { Ring } from "@/lib/geometry/point";
import { cornersOf, type Rectangle } from "@/lib/geometry/rectangle";

export type PlacedFooting = Rectangle & {
  id: FootingId;
  mark: string;
  foundingLevel_m: number;
  valueId: ValueId | null;
};

/** A zone as it is drawn now, with the values that it carries. */
export type ZoneWithValues = {
  id: ZoneId;
  name: string;
  ring_m: Ring;
  values: ZoneValue[];
};

export type ZoneValue = {
  id: ValueId;
  reference: string;
  groundUnitId: GroundUnitId;
  groundUnit: string;
  /** Null while no revision is in force. */
  code: string | null;
  netAllowable_kPa: number | null;
  highestFoundingLevel_m: number | null;
  lowestFoundingLevel_m: number | null;
};

/** Less than this part of a footprint is the rounding of a coordinate, not ground. */
const SLIVER = 1e-6;

/** Within a billionth of the whole is the rounding of an area. */
const whole = (share: number): number => (share > 1 - 1e-9 ? 1 : share);

type Touched = { zone: ZoneWithValues; share: number };

/**
 * Proposes the value that a footing would stand on, from the zones under its footprint. Proposes none where the
 * footprint leaves the zones, where a zone has no value in force, or where two ground units could be meant.
 */
export function suggestLink(footing: PlacedFooting, zones: readonly ZoneWithValues[]): LinkSuggestion {
  const corners = cornersOf(footing);
  const touched: Touched[] = zones
    .map((zone) => ({ zone, share: whole(shareInside(corners, zone.ring_m)) }))
    .filter(({ share }) => share > SLIVER)
    .sort((a, b) => b.share - a.share || (a.zone.name < b.zone.name ? -1 : 1));
  const straddles = touched.some(({ share }) => share < 1 - SLIVER) && touched.length > 1;
  const candidates = touched.flatMap(({ zone, share }) =>
    zone.values.map((value) => candidateOf(value, zone, share)),
  );
  const { value, sentence } = choose(footing, touched);
  return {
    footingId: footing.id,
    mark: footing.mark,
    linkedTo: footing.valueId,
    valueId: value?.id ?? null,
    sentence,
    straddles,
    candidates,
  };
}

function choose(footing: PlacedFooting, touched: Touched[]): { value: ZoneValue | null; sentence: string } {
  const none = (sentence: string) => ({ value: null, sentence });
  if (touched.length === 0) return none("The footing lies in no zone.");
  const units = new Map<GroundUnitId, { name: string; touched: Touched[]; values: ZoneValue[] }>();
  for (const each of touched)
    for (const value of each.zone.values) {
      if (value.code === null || !levelFits(footing, value)) continue;
      const unit = units.get(value.groundUnitId) ?? { name: value.groundUnit, touched: [], values: [] };
      unit.touched.push(each);
      unit.values.push(value);
      units.set(value.groundUnitId, unit);
    }
  // Zones that share a ground unit do not overlap, so the shares of one unit add up to what it covers.
  const covering = [...units.values()].filter(
    (unit) => unit.touched.reduce((sum, { share }) => sum + share, 0) > 1 - SLIVER * unit.touched.length,
  );
  if (covering.length > 1)
    return none(
      `Values of ${covering.map(({ name }) => name).join(" and ")} could be meant: choose the ground unit at founding level.`,
    );
  const [unit] = covering;
  if (unit) return lowestOf(unit);
  const mixed = lowestAcrossUnits(footing, touched);
  if (mixed) return mixed;
  const zones = touched.map(({ zone }) => zone.name).join(" and ");
  const covered = touched.reduce((sum, { share }) => sum + share, 0);
  if (covered < 1 - SLIVER * touched.length)
    return none(
      `The footing lies only partly in ${zones}: ${percent(1 - Math.min(1, covered))} of it is in no zone.`,
    );
  return none(`${zones}: no value in force covers the whole footprint at this founding level.`);
}

function lowestOf(unit: { touched: Touched[]; values: ZoneValue[] }): { value: ZoneValue; sentence: string } {
  const [only] = unit.values;
  if (unit.values.length === 1 && only) {
    const zone = unit.touched[0]?.zone.name;
    return { value: only, sentence: `The whole footprint lies in ${zone}; ${only.groundUnit}.` };
  }
  return lower(unit.touched, unit.values);
}

/** A footing across zones of different units, each with a single value: the lowest of them (row by row, as drawn). */
function lowestAcrossUnits(
  footing: PlacedFooting,
  touched: Touched[],
): { value: ZoneValue; sentence: string } | null {
  if (touched.length < 2) return null;
  const covered = touched.reduce((sum, { share }) => sum + share, 0);
  if (covered < 1 - SLIVER * touched.length) return null;
  const values = touched.map(({ zone }) =>
    zone.values.filter((value) => value.code !== null && levelFits(footing, value)),
  );
  if (values.some((each) => each.length !== 1)) return null;
  return lower(touched, values.flat());
}

function lower(touched: Touched[], values: ZoneValue[]): { value: ZoneValue; sentence: string } {
  const stated = values.filter(({ netAllowable_kPa }) => netAllowable_kPa !== null);
  const pool = stated.length === values.length ? values : [];
  const value = pool.reduce<ZoneValue | undefined>(
    (least, each) =>
      least === undefined || (each.netAllowable_kPa ?? 0) < (least.netAllowable_kPa ?? 0) ? each : least,
    undefined,
  );
  const parts = touched.map(({ zone, share }) => `${zone.name} (${percent(share)})`).join(" and ");
  // A table has no one pressure to compare: the first is offered, and the sentence says that it was not compared.
  if (!value)
    return {
      value: values[0] as ZoneValue,
      sentence: `Straddles ${parts}; the values could not be compared.`,
    };
  return {
    value,
    sentence: `Straddles ${parts}: the lower value, ${value.reference} at ${value.netAllowable_kPa} kPa net, is proposed.`,
  };
}

const levelFits = (footing: PlacedFooting, value: ZoneValue): boolean =>
  (value.highestFoundingLevel_m === null || footing.foundingLevel_m <= value.highestFoundingLevel_m) &&
  (value.lowestFoundingLevel_m === null || footing.foundingLevel_m >= value.lowestFoundingLevel_m);

const percent = (share: number): string => `${share < 0.01 ? "under 1" : Math.round(share * 100)} %`;

const candidateOf = (value: ZoneValue, zone: ZoneWithValues, share: number): LinkCandidate => ({
  valueId: value.id,
  reference: value.reference,
  zone: zone.name,
  groundUnit: value.groundUnit,
  code: value.code,
  netAllowable_kPa: value.netAllowable_kPa,
  share,
});
