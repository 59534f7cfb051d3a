import type { FootingId, HoleId } from "./ids";

export type PlanHole = {
  id: HoleId;
  name: string;
  kind: string;
  status: string;
  easting_m: number;
  northing_m: number;
  groundLevel_m: number | null;
};
export type PlanFooting = {
  id: FootingId;
  mark: string;
  easting_m: number;
  northing_m: number;
  orientation_deg: number;
  breadth_m: number;
  length_m: number;
  stage: string;
  verdict: "passes" | "fails" | "outside conditions" | null;
  utilisation: number | null;
  standing: "current" | "affected" | "replaced" | null;
  linked: boolean;
};
export type PlanPage = {
  holes: PlanHole[];
  footings: PlanFooting[];
  sitePlan: {
    documentRevisionId: string;
    width_px: number;
    height_px: number;
    points: { x_px: number; y_px: number; easting_m: number; northing_m: number }[];
  } | null;
};
