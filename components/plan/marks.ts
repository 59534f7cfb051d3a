import type { PlanFooting, PlanHole } from "@/lib/contracts/plan";
import { containsPoint } from "@/lib/geometry/polygon";
import { cornersOf } from "@/lib/geometry/rectangle";

/** What a mark on the plan stands for. */
export type Picked = { kind: "hole"; id: string } | { kind: "footing"; id: string } | null;

/** Where a place of the site grid falls on the drawing, in pixels. */
export type Screen = {
  width_px: number;
  height_px: number;
  pixelsPerMetre: number;
  at: (easting_m: number, northing_m: number) => [x: number, y: number];
};
export type Inks = Record<
  "ink" | "ink2" | "sheet" | "passes" | "fails" | "affected" | "outside" | "action",
  string
>;
export type Layers = { holes: boolean; footings: boolean; names: boolean };

/** Above this many marks in view they are drawn as counts in squares, so that a pan stays smooth. */
export const AGGREGATE_ABOVE = 6000;
const SQUARE_PX = 48;

type Drawn = { holes: PlanHole[]; footings: PlanFooting[] };

/** What lies in view, with a margin for marks that reach in from outside. */
export function inView(all: Drawn, screen: Screen): Drawn {
  const margin = 20;
  const seen = ({ easting_m, northing_m }: { easting_m: number; northing_m: number }) => {
    const [x, y] = screen.at(easting_m, northing_m);
    return x > -margin && y > -margin && x < screen.width_px + margin && y < screen.height_px + margin;
  };
  return { holes: all.holes.filter(seen), footings: all.footings.filter(seen) };
}

/** How a footing shows: what is wrong with it goes before what is right. */
export function signOf(footing: PlanFooting): "affected" | "fails" | "outside" | "passes" | "none" {
  if (footing.standing === "affected") return "affected";
  if (footing.verdict === "fails") return "fails";
  if (footing.verdict === "outside conditions") return "outside";
  return footing.verdict === "passes" ? "passes" : "none";
}

/** Draws every mark in view in one pass: holes by kind, footings to scale with their sign, or counts where there are too many. */
export function drawMarks(
  pen: CanvasRenderingContext2D,
  all: Drawn,
  screen: Screen,
  inks: Inks,
  layers: Layers,
  picked: Picked,
) {
  pen.clearRect(0, 0, screen.width_px, screen.height_px);
  const shown = inView(
    { holes: layers.holes ? all.holes : [], footings: layers.footings ? all.footings : [] },
    screen,
  );
  if (shown.holes.length + shown.footings.length > AGGREGATE_ABOVE) {
    drawCounts(pen, shown, screen, inks);
    return;
  }
  for (const footing of shown.footings) drawFooting(pen, footing, screen, inks, layers, picked);
  for (const hole of shown.holes) drawHole(pen, hole, screen, inks, layers, picked);
}

function drawCounts(pen: CanvasRenderingContext2D, shown: Drawn, screen: Screen, inks: Inks) {
  const squares = new Map<string, { x: number; y: number; count: number; wrong: number }>();
  const add = (easting_m: number, northing_m: number, wrong: boolean) => {
    const [x, y] = screen.at(easting_m, northing_m);
    const column = Math.floor(x / SQUARE_PX);
    const row = Math.floor(y / SQUARE_PX);
    const key = `${column} ${row}`;
    const square = squares.get(key) ?? { x: column * SQUARE_PX, y: row * SQUARE_PX, count: 0, wrong: 0 };
    square.count += 1;
    if (wrong) square.wrong += 1;
    squares.set(key, square);
  };
  for (const hole of shown.holes) add(hole.easting_m, hole.northing_m, false);
  for (const footing of shown.footings)
    add(footing.easting_m, footing.northing_m, !["passes", "none"].includes(signOf(footing)));
  pen.font = '12px "Roboto Variable", sans-serif';
  pen.textAlign = "center";
  pen.textBaseline = "middle";
  for (const { x, y, count, wrong } of squares.values()) {
    pen.fillStyle = inks.sheet;
    pen.strokeStyle = wrong > 0 ? inks.fails : inks.ink2;
    pen.lineWidth = wrong > 0 ? 2 : 1;
    pen.fillRect(x + 3, y + 8, SQUARE_PX - 6, SQUARE_PX - 16);
    pen.strokeRect(x + 3, y + 8, SQUARE_PX - 6, SQUARE_PX - 16);
    pen.fillStyle = inks.ink;
    pen.fillText(wrong > 0 ? `${count} (${wrong}!)` : String(count), x + SQUARE_PX / 2, y + SQUARE_PX / 2);
  }
}

function drawFooting(
  pen: CanvasRenderingContext2D,
  footing: PlanFooting,
  screen: Screen,
  inks: Inks,
  layers: Layers,
  picked: Picked,
) {
  const corners = cornersOf(footing).map(([easting, northing]) => screen.at(easting, northing));
  const [x, y] = screen.at(footing.easting_m, footing.northing_m);
  const size_px = Math.min(footing.breadth_m, footing.length_m) * screen.pixelsPerMetre;
  const sign = signOf(footing);
  const colour = sign === "none" ? inks.ink2 : inks[sign];
  pen.beginPath();
  for (const [at, [cx, cy]] of corners.entries()) {
    if (at === 0) pen.moveTo(cx, cy);
    else pen.lineTo(cx, cy);
  }
  pen.closePath();
  pen.fillStyle = inks.sheet;
  pen.fill();
  pen.strokeStyle = picked?.kind === "footing" && picked.id === footing.id ? inks.action : inks.ink;
  pen.lineWidth = picked?.kind === "footing" && picked.id === footing.id ? 3 : 1;
  pen.stroke();
  const r = Math.max(2.5, Math.min(6, size_px / 3));
  pen.beginPath();
  if (sign === "affected") {
    pen.moveTo(x, y - r);
    pen.lineTo(x + r, y + r * 0.8);
    pen.lineTo(x - r, y + r * 0.8);
    pen.closePath();
  } else if (sign === "fails") pen.rect(x - r * 0.8, y - r * 0.8, r * 1.6, r * 1.6);
  else if (sign === "outside") {
    pen.moveTo(x, y - r);
    pen.lineTo(x + r, y);
    pen.lineTo(x, y + r);
    pen.lineTo(x - r, y);
    pen.closePath();
  } else pen.arc(x, y, r * 0.75, 0, 2 * Math.PI);
  if (sign === "none" || sign === "outside") {
    pen.strokeStyle = colour;
    pen.lineWidth = 1.6;
    pen.stroke();
  } else {
    pen.fillStyle = colour;
    pen.fill();
  }
  if (layers.names && size_px > 18) label(pen, footing.mark, x, y - size_px / 2 - 4, inks);
}

/** Boreholes are circles with a cross, pits squares, probes and samplers triangles that point down. */
function drawHole(
  pen: CanvasRenderingContext2D,
  hole: PlanHole,
  screen: Screen,
  inks: Inks,
  layers: Layers,
  picked: Picked,
) {
  const [x, y] = screen.at(hole.easting_m, hole.northing_m);
  const chosen = picked?.kind === "hole" && picked.id === hole.id;
  const r = chosen ? 7 : 5;
  pen.strokeStyle = chosen ? inks.action : inks.ink;
  pen.fillStyle = inks.sheet;
  pen.lineWidth = chosen ? 2.4 : 1.3;
  // Holes that are not final are drawn broken.
  pen.setLineDash(["PROPOSED", "DRAFT", "PRELIM"].includes(hole.status) ? [2, 2] : []);
  pen.beginPath();
  if (/^(TP|IP)/.test(hole.kind)) pen.rect(x - r, y - r, 2 * r, 2 * r);
  else if (/^(CPT|SCP|DP|DCP|WS|WLS|DS|HA)/.test(hole.kind)) {
    pen.moveTo(x - r, y - r);
    pen.lineTo(x + r, y - r);
    pen.lineTo(x, y + r);
    pen.closePath();
  } else pen.arc(x, y, r, 0, 2 * Math.PI);
  pen.fill();
  pen.stroke();
  pen.setLineDash([]);
  if (!/^(TP|IP|CPT|SCP|DP|DCP|WS|WLS|DS|HA)/.test(hole.kind)) {
    pen.beginPath();
    pen.moveTo(x - r, y);
    pen.lineTo(x + r, y);
    pen.moveTo(x, y - r);
    pen.lineTo(x, y + r);
    pen.stroke();
  }
  if (layers.names && screen.pixelsPerMetre > 1.5) label(pen, hole.name, x, y - r - 3, inks);
}

function label(pen: CanvasRenderingContext2D, text: string, x: number, y: number, inks: Inks) {
  pen.font = '12px "Roboto Variable", sans-serif';
  pen.textAlign = "center";
  pen.textBaseline = "alphabetic";
  pen.lineWidth = 3;
  pen.strokeStyle = inks.sheet;
  pen.strokeText(text, x, y);
  pen.fillStyle = inks.ink;
  pen.fillText(text, x, y);
}

/** What lies under a press: a hole within nine pixels, else the footing that the place lies in or nearly in. */
export function pickedAt(all: Drawn, screen: Screen, easting_m: number, northing_m: number): Picked {
  const near_m = 9 / screen.pixelsPerMetre;
  let best: Picked = null;
  let least = near_m;
  for (const hole of all.holes) {
    const apart = Math.hypot(hole.easting_m - easting_m, hole.northing_m - northing_m);
    if (apart < least) {
      least = apart;
      best = { kind: "hole", id: hole.id };
    }
  }
  if (best) return best;
  for (const footing of all.footings) {
    const apart = Math.hypot(footing.easting_m - easting_m, footing.northing_m - northing_m);
    if (apart > near_m + footing.breadth_m + footing.length_m) continue;
    if (containsPoint(cornersOf(footing), [easting_m, northing_m]) || apart < near_m)
      return { kind: "footing", id: footing.id };
  }
  return null;
}
