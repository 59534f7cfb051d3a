/** How the choices of a bearing value are written on the screen, on sheets and in sentences. No zod here: browsers load it. */
export const valueWords = {
  givenBasis: {
    net: "Net: above the existing overburden",
    gross: "Gross: everything above the underside of the base",
  },
  factorConvention: {
    "net-over-factor": "Factor on the net ultimate: (q ult − σ0) / F",
    "gross-over-factor": "Factor on the gross ultimate: q ult / F",
    "not-stated": "The report does not say",
  },
  comparedWith: {
    maximum: "The largest edge pressure",
    "effective-area": "The uniform pressure on the effective area",
  },
  loadBasis: {
    "characteristic-full": "Working loads: permanent and full variable",
    "characteristic-reduced": "Working loads: permanent and reduced variable",
    "design-factored": "Factored design loads",
  },
  governedBy: {
    strength: "Strength",
    settlement: "Settlement",
    "not-stated": "The report does not say",
  },
  drainage: { drained: "Drained", undrained: "Undrained", both: "The lower of both" },
  transientIncrease: {
    none: "No: the report grants none",
    granted: "Yes: granted by the report, with these factors",
  },
  basis: {
    recommended: "Recommended by a report",
    assumed: "Assumed before investigation",
    presumptive: "Presumed from a code's table",
  },
  purpose: { preliminary: "Preliminary", "for-design": "For design" },
  reasonCode: {
    first: "First value",
    "new-hole": "New hole",
    laboratory: "Laboratory result",
    water: "Groundwater",
    "plate-test": "Plate or other field test",
    formation: "Ground found at formation",
    loads: "Loads or use changed",
    error: "Error found",
    report: "Report revised",
  },
} as const;

/** The label of each stated field, its unit (empty for words), in the order in which it is read. */
export const valueFields = [
  { name: "netAllowable_kPa", label: "Net allowable bearing pressure", unit: "kPa" },
  { name: "given", label: "As the report gives it", unit: "" },
  { name: "givenBasis", label: "Net or gross in the report", unit: "" },
  { name: "givenOverburden_kPa", label: "Overburden taken off a gross figure", unit: "kPa" },
  { name: "factorConvention", label: "Factor convention", unit: "" },
  { name: "factorOfSafety", label: "Factor of safety", unit: "" },
  { name: "comparedWith", label: "Compared with", unit: "" },
  { name: "loadBasis", label: "Loads it goes with", unit: "" },
  { name: "transientIncrease", label: "Increase for short-term loads", unit: "" },
  { name: "transientFactor", label: "Factor for transient combinations", unit: "" },
  { name: "accidentalFactor", label: "Factor for accidental combinations", unit: "" },
  { name: "governedBy", label: "Governed by", unit: "" },
  { name: "settlementLimit_mm", label: "Settlement limit behind it", unit: "mm" },
  { name: "settlementPredicted_mm", label: "Settlement predicted", unit: "mm" },
  { name: "minBreadth_m", label: "Least breadth", unit: "m" },
  { name: "maxBreadth_m", label: "Greatest breadth", unit: "m" },
  { name: "minFoundingDepth_m", label: "Least founding depth below ground", unit: "m" },
  { name: "highestFoundingLevel_m", label: "Highest founding level", unit: "m" },
  { name: "lowestFoundingLevel_m", label: "Lowest founding level", unit: "m" },
  { name: "groundwaterLevel_m", label: "Groundwater level assumed", unit: "m" },
  { name: "groundwaterBasis", label: "What the groundwater level rests on", unit: "" },
  { name: "soilUnitWeight_kNm3", label: "Unit weight of the soil above founding level", unit: "kN/m³" },
  { name: "drainage", label: "Drainage", unit: "" },
  { name: "neighbours", label: "Neighbouring footings, slopes, excavations", unit: "" },
  { name: "conditions", label: "Other conditions", unit: "" },
  { name: "basis", label: "Where the value comes from", unit: "" },
  { name: "confirmBy", label: "To be confirmed by", unit: "" },
  { name: "confirmWho", label: "To be confirmed by whom", unit: "" },
  { name: "purpose", label: "Good for", unit: "" },
] as const;

export type ValueFieldName = (typeof valueFields)[number]["name"];
