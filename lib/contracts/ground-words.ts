/** Words of holes and ground without their schemas: pages take them from here, and carry no schema to the browser. */

/** Kinds of soil and rock that choose a hatch. */
export const soils = [
  "made-ground",
  "topsoil",
  "clay",
  "silt",
  "sand",
  "gravel",
  "peat",
  "cobbles",
  "mudstone",
  "siltstone",
  "sandstone",
  "limestone",
  "chalk",
  "coal",
  "breccia",
  "conglomerate",
  "igneous",
  "metamorphic",
  "rock",
  "concrete",
  "void",
  "unknown",
] as const;
export type Soil = (typeof soils)[number];

/** Kinds of exploratory hole as the AGS data format codes them, with the words for each. */
export const holeKinds: Record<string, string> = {
  CP: "Cable percussion borehole",
  RC: "Rotary cored borehole",
  RO: "Rotary open hole",
  "CP+RC": "Cable percussion with rotary follow-on",
  SNC: "Sonic borehole",
  WS: "Window sampler",
  WLS: "Windowless sampler",
  DS: "Dynamic sampler",
  HA: "Hand auger",
  TP: "Trial pit or trench",
  IP: "Inspection pit",
  CPT: "Cone penetration test",
  DP: "Dynamic probe",
  DCP: "Dynamic cone penetrometer",
};
export const holeStatuses = ["", "PROPOSED", "DRAFT", "PRELIM", "FINAL", "HISTORIC"] as const;
