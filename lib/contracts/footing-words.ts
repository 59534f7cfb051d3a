/** Words of footings without their schemas: pages take them from here, and carry no schema to the browser. */

/** Stages on site, in order. */
export const stages = ["designed", "issued", "excavated", "formation-accepted", "poured"] as const;
export type StageWord = (typeof stages)[number];

/** How a stage is written on the screen. */
export const stageTitles: Record<StageWord, string> = {
  designed: "designed",
  issued: "issued for construction",
  excavated: "excavated",
  "formation-accepted": "formation accepted",
  poured: "poured",
};

/** Bases of loads; a value and the loads checked against it have the same. */
export const loadBases = ["characteristic-full", "characteristic-reduced", "design-factored"] as const;
export type LoadBasis = (typeof loadBases)[number];
export const loadBasisTitles: Record<LoadBasis, string> = {
  "characteristic-full": "characteristic (service), full variable load",
  "characteristic-reduced": "characteristic (service), reduced variable load",
  "design-factored": "design (factored)",
};

/** How long a combination acts. */
export const durations = ["permanent", "transient", "accidental"] as const;
