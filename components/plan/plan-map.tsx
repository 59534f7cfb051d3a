"use client";

import "leaflet/dist/leaflet.css";
import "@geoman-io/leaflet-geoman-free/dist/leaflet-geoman.css";
import L from "leaflet";
import "@geoman-io/leaflet-geoman-free";
import { useEffect, useRef, useState } from "react";
import type { PlanPage } from "@/lib/contracts/plan";
import type { ZoneRow } from "@/lib/contracts/zones";
import { drawMarks, type Inks, type Layers, type Picked, pickedAt, type Screen } from "./marks";

export type Task = { kind: "look" } | { kind: "draw" } | { kind: "reshape"; zoneId: string };
type Props = {
  plan: PlanPage;
  zones: ZoneRow[];
  layers: Layers & { zones: boolean };
  picked: Picked;
  chosenZone: string | null;
  task: Task;
  onPick: (picked: Picked) => void;
  onZone: (zoneId: string) => void;
  /** The boundary as it is drawn or reshaped: [[easting, northing], …]. */
  onRing: (ring_m: [number, number][]) => void;
};

const inkNames: Record<keyof Inks, string> = {
  ink: "--ink",
  ink2: "--ink-2",
  sheet: "--sheet",
  passes: "--passes",
  fails: "--fails",
  affected: "--affected",
  outside: "--outside",
  action: "--action",
};

function inksOf(element: HTMLElement): Inks {
  const style = getComputedStyle(element);
  return Object.fromEntries(
    Object.entries(inkNames).map(([name, variable]) => [name, style.getPropertyValue(variable).trim()]),
  ) as Inks;
}

/** The plan in metres of the site grid: zones to be drawn and reshaped, holes and footings on one canvas above them. */
export default function PlanMap(props: Props) {
  const { plan, zones, layers, picked, chosenZone, task } = props;
  const place = useRef<HTMLDivElement>(null);
  const map = useRef<L.Map | null>(null);
  const redraw = useRef<() => void>(() => {});
  const latest = useRef(props);
  latest.current = props;
  const [cursor, setCursor] = useState<{ easting_m: number; northing_m: number } | null>(null);

  useEffect(() => {
    const element = place.current;
    if (!element) return;
    const made = L.map(element, {
      crs: L.CRS.Simple,
      minZoom: -8,
      maxZoom: 7,
      zoomSnap: 0.25,
      zoomDelta: 0.5,
      attributionControl: false,
    });
    L.control.scale({ imperial: false, maxWidth: 160 }).addTo(made);
    made.setView([0, 0], 0);
    const canvas = L.DomUtil.create("canvas", "leaflet-zoom-hide", made.getPanes().markerPane);
    const pen = canvas.getContext("2d");
    const screenNow = (): Screen => {
      const size = made.getSize();
      const origin = made.containerPointToLatLng([0, 0]);
      const pixelsPerMetre = made.getZoomScale(made.getZoom(), 0);
      return {
        width_px: size.x,
        height_px: size.y,
        pixelsPerMetre,
        at: (easting_m, northing_m) => [
          (easting_m - origin.lng) * pixelsPerMetre,
          (origin.lat - northing_m) * pixelsPerMetre,
        ],
      };
    };
    redraw.current = () => {
      if (!pen) return;
      const screen = screenNow();
      const dense = window.devicePixelRatio || 1;
      if (canvas.width !== screen.width_px * dense || canvas.height !== screen.height_px * dense) {
        canvas.width = screen.width_px * dense;
        canvas.height = screen.height_px * dense;
        canvas.style.width = `${screen.width_px}px`;
        canvas.style.height = `${screen.height_px}px`;
      }
      canvas.style.pointerEvents = "none";
      L.DomUtil.setPosition(canvas, made.containerPointToLayerPoint([0, 0]));
      pen.setTransform(dense, 0, 0, dense, 0, 0);
      drawMarks(
        pen,
        latest.current.plan,
        screen,
        inksOf(element),
        latest.current.layers,
        latest.current.picked,
      );
    };
    made.on("moveend zoomend resize viewreset", () => redraw.current());
    made.on("mousemove", (event) => setCursor({ easting_m: event.latlng.lng, northing_m: event.latlng.lat }));
    made.on("mouseout", () => setCursor(null));
    made.on("click", (event) => {
      if (latest.current.task.kind !== "look") return;
      const { lng, lat } = event.latlng;
      latest.current.onPick(pickedAt(latest.current.plan, screenNow(), lng, lat));
    });
    made.on("pm:create", ({ layer }) => {
      latest.current.onRing(ringOf(layer as L.Polygon));
      layer.on("pm:edit", () => latest.current.onRing(ringOf(layer as L.Polygon)));
      (layer as L.Polygon).pm.enable({ allowSelfIntersection: true });
    });
    map.current = made;
    return () => {
      map.current = null;
      made.remove();
    };
  }, []);

  // The whole site once, when there is something to see; afterwards the view is the reader's own.
  const fitted = useRef(false);
  useEffect(() => {
    const points = [
      ...plan.holes.map((hole): [number, number] => [hole.northing_m, hole.easting_m]),
      ...plan.footings.map((footing): [number, number] => [footing.northing_m, footing.easting_m]),
      ...zones.flatMap((zone) => zone.ring_m.map(([e, n]): [number, number] => [n, e])),
    ];
    if (map.current && !fitted.current && points.length > 0) {
      map.current.fitBounds(L.latLngBounds(points), { padding: [30, 30], animate: false });
      fitted.current = true;
    }
    redraw.current();
  }, [plan, zones]);

  useEffect(() => {
    const made = map.current;
    const element = place.current;
    if (!made || !element) return;
    const inks = inksOf(element);
    const group = L.layerGroup().addTo(made);
    if (layers.zones)
      for (const zone of zones) {
        const chosen = zone.id === chosenZone;
        const polygon = L.polygon(
          zone.ring_m.map(([easting, northing]): [number, number] => [northing, easting]),
          {
            color: chosen ? inks.action : inks.ink2,
            weight: chosen ? 3 : 1.5,
            dashArray:
              zone.boundary === "proved" ? undefined : zone.boundary === "interpolated" ? "8 5" : "2 5",
            fillColor: inks.action,
            fillOpacity: chosen ? 0.1 : 0.03,
          },
        );
        polygon.on("click", () => {
          if (latest.current.task.kind === "look") latest.current.onZone(zone.id);
        });
        const nameNode = document.createElement("span");
        nameNode.textContent = zone.name;
        polygon.bindTooltip(nameNode, { permanent: true, direction: "center", className: "plan-zone-name" });
        polygon.addTo(group);
        if (task.kind === "reshape" && task.zoneId === zone.id) {
          polygon.pm.enable({ allowSelfIntersection: true });
          polygon.on("pm:edit", () => latest.current.onRing(ringOf(polygon)));
        }
      }
    return () => {
      group.remove();
    };
  }, [zones, layers.zones, chosenZone, task]);

  useEffect(() => {
    const made = map.current;
    if (!made || task.kind !== "draw") return;
    made.pm.enableDraw("Polygon", { snappable: true, allowSelfIntersection: true, continueDrawing: false });
    return () => {
      made.pm.disableDraw();
      for (const layer of made.pm.getGeomanDrawLayers()) layer.remove();
    };
  }, [task]);

  // biome-ignore lint/correctness/useExhaustiveDependencies: what is drawn is read from the latest props
  useEffect(() => redraw.current(), [layers, picked]);

  return (
    <div className="relative">
      {/* biome-ignore lint/a11y/useSemanticElements: a map is no fieldset */}
      <div
        ref={place}
        role="group"
        aria-label="Plan of the site, in metres of the site grid. Everything on it is also in the lists beside it."
        className="h-[70vh] min-h-96 border border-rule bg-sheet"
      />
      <p
        className="absolute top-2 right-2 z-[500] border border-rule bg-sheet px-2 py-0.5 text-sm"
        aria-hidden="true"
      >
        {cursor ? `E ${cursor.easting_m.toFixed(2)}  N ${cursor.northing_m.toFixed(2)} m` : "N ↑"}
      </p>
    </div>
  );
}

function ringOf(polygon: L.Polygon): [number, number][] {
  const [outer] = polygon.getLatLngs() as L.LatLng[][];
  return (outer ?? []).map(({ lng, lat }) => [Math.round(lng * 1000) / 1000, Math.round(lat * 1000) / 1000]);
}
