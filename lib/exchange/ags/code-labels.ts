/** Codes are facts of the format; the words for them are our own. */
const codes: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  LOCA_TYPE: {
    CP: "Cable percussion boring",
    RC: "Rotary boring with core",
    RO: "Rotary boring without core",
    TP: "Trial pit or trench",
    IP: "Inspection pit",
    WS: "Window sampler",
    WLS: "Windowless sampler",
    DS: "Dynamic sampler",
    HA: "Hand auger",
    SNC: "Sonic boring",
    VE: "Vacuum excavation",
    CPT: "Cone penetration test",
    SCP: "Static cone penetration test",
    DCP: "Dynamic cone penetrometer",
    DP: "Dynamic probe",
    W: "Wash boring",
    EXP: "Exposure",
    INST: "Instrument",
  },
  LOCA_STAT: {
    PROPOSED: "Planned, not yet made",
    DRAFT: "Draft record",
    PRELIM: "Preliminary record",
    FINAL: "Final record",
    HISTORIC: "From an earlier investigation",
  },
  LOCA_GREF: {
    OSGB: "British national grid",
    OSI: "Irish grid",
    ITM: "Irish Transverse Mercator",
    LOCAL: "Local grid",
  },
  ISPT_TYPE: { S: "Split spoon", C: "Solid cone" },
  SAMP_TYPE: {
    B: "Bulk",
    LB: "Large bulk",
    D: "Small disturbed",
    U: "Open drive, undisturbed",
    UT: "Thin wall, undisturbed",
    TW: "Thin wall, pushed",
    P: "Piston",
    C: "Core",
    BLK: "Block",
    L: "Liner",
    M: "Mazier",
    W: "Water",
    G: "Gas",
    ES: "Environmental soil",
    EW: "Environmental water",
  },
  MONG_TYPE: {
    SP: "Standpipe",
    SPIE: "Standpipe piezometer",
    EPIE: "Electric piezometer",
    PPIE: "Pneumatic piezometer",
    HPIE: "Hydraulic piezometer",
    GWMP: "Groundwater monitoring point",
    MSET: "Levelling point",
    ICE: "Inclinometer",
  },
  MOND_TYPE: { WDEP: "Depth to water", WHD: "Head of water", LEV: "Level", PRES: "Pressure" },
  FILE_DOCT: { REP: "Report", DRAW: "Drawing", PH: "Photograph", CAL: "Calibration", GEN: "General" },
  DICT_TYPE: { GROUP: "Declares a group", HEADING: "Declares a heading" },
  DICT_STAT: {
    KEY: "Part of the key",
    REQUIRED: "Must be filled",
    "KEY+REQUIRED": "Part of the key, must be filled",
    OTHER: "May be empty",
  },
};

const legend = [
  "",
  "Made ground",
  "Clay",
  "Silt",
  "Sand",
  "Gravel",
  "Peat",
  "Cobbles or boulders",
  "Rock",
  "Backfill",
];

const units: Readonly<Record<string, string>> = {
  m: "metre",
  mm: "millimetre",
  "%": "per cent",
  min: "minute",
  kPa: "kilopascal",
  kN: "kilonewton",
  kNm: "kilonewton metre",
  deg: "degree",
  "yyyy-mm-dd": "year, month, day",
  "yyyy-mm-ddThh:mm": "date, hours and minutes",
  "yyyy-mm-ddThh:mm:ss": "date, hours, minutes and seconds",
};

const types: Readonly<Record<string, string>> = {
  ID: "Identifier",
  X: "Text",
  XN: "Text or number",
  PA: "Code listed in ABBR",
  PT: "Type listed in TYPE",
  PU: "Unit listed in UNIT",
  DT: "Date or time",
  YN: "Yes or no",
  U: "Number of any form",
};

/** What a code means; the code itself where no words are known. */
export function codeLabel(heading: string, code: string): string {
  const known = codes[heading];
  if (known && Object.hasOwn(known, code)) return known[code] ?? code;
  if (heading === "GEOL_LEG" && /^[1-9]\d\d$/.test(code)) return legend[Number(code.charAt(0))] ?? code;
  return code;
}

/** What a unit is called; the unit itself where no words are known. */
export function unitLabel(unit: string): string {
  return Object.hasOwn(units, unit) ? (units[unit] ?? unit) : unit;
}

/** What a data type asks for. */
export function typeLabel(type: string): string {
  const places = /^(\d+)(DP|SF|SCI)$/.exec(type);
  if (places?.[2] === "DP") return `Number with ${places[1]} decimal places`;
  if (places?.[2] === "SF") return `Number with ${places[1]} significant figures`;
  if (places?.[2] === "SCI") return `Scientific form with ${places[1]} decimal places`;
  return Object.hasOwn(types, type) ? (types[type] ?? type) : type;
}
