import type { AgsFinding, AgsGroup } from "./file-model";

/** Where a register row came from: "group X, line 263". */
export interface AgsSource {
  readonly group: string;
  readonly line: number;
}

/** A reading that may be a number or a word: "Dry" has the text and no number, never 0. */
export interface TextOrNumber {
  readonly text: string;
  readonly number: number | null;
}

/** A position on plan in metres. */
export interface PlanPoint {
  readonly easting_m: number;
  readonly northing_m: number;
}

/** What the file says of its project. */
export interface GroundProject extends AgsSource {
  readonly projectId: string;
  readonly name: string;
  readonly location: string;
  readonly client: string;
  readonly contractor: string;
  readonly engineer: string;
  readonly memo: string;
}

/** What the file says of its own issue. */
export interface GroundTransmittal extends AgsSource {
  readonly issueNumber: string;
  /** As written; `isoDate` is the same as yyyy-mm-dd where it is a real date. */
  readonly date: string;
  readonly isoDate: string | null;
  readonly producer: string;
  /** Free text in the format: "Final", "Preliminary" … */
  readonly status: string;
  readonly description: string;
  readonly edition: string;
  readonly recipient: string;
  readonly remarks: string;
}

/** One declared code and its meaning. */
export interface GroundAbbreviation extends AgsSource {
  readonly heading: string;
  readonly code: string;
  readonly description: string;
}

/** One exploratory hole as the file gives it. */
export interface GroundHole extends AgsSource {
  /** LOCA_ID, trimmed. */
  readonly name: string;
  /** LOCA_TYPE as written, e.g. "CP+RC". */
  readonly kind: string;
  readonly kindCodes: readonly string[];
  /** PROPOSED, DRAFT, PRELIM, FINAL, HISTORIC, "" or another text, upper case where it is one of the five. */
  readonly status: string;
  readonly national: PlanPoint | null;
  /** LOCA_GREF, e.g. OSGB. */
  readonly nationalGrid: string;
  readonly local: PlanPoint | null;
  /** LOCA_LREF. */
  readonly localGrid: string;
  /** Null when empty, "Null" or an unbelieved 0; `groundLevelText` keeps what was written. */
  readonly groundLevel_m: number | null;
  readonly groundLevelText: string;
  readonly localLevel_m: number | null;
  /** LOCA_NATD, the national vertical datum. */
  readonly verticalDatum: string;
  /** LOCA_DATM, a local datum. */
  readonly localDatum: string;
  readonly finalDepth_m: number | null;
  readonly startDate: string | null;
  readonly endDate: string | null;
  readonly startText: string;
  readonly endText: string;
  readonly latitude_deg: number | null;
  readonly longitude_deg: number | null;
  readonly purpose: string;
  readonly termination: string;
  readonly originalName: string;
  readonly loggedBy: string;
  readonly remarks: string;
  /** Deviation from the vertical, where HORN gives an inclination. */
  readonly inclined: boolean;
}

/** Principal soil or rock read by machine from the legend code or the words; chooses the hatch. */
export type PrincipalSoil =
  | "made-ground"
  | "topsoil"
  | "clay"
  | "silt"
  | "sand"
  | "gravel"
  | "peat"
  | "cobbles"
  | "mudstone"
  | "siltstone"
  | "sandstone"
  | "limestone"
  | "chalk"
  | "coal"
  | "breccia"
  | "conglomerate"
  | "igneous"
  | "metamorphic"
  | "rock"
  | "concrete"
  | "void"
  | "unknown";

/** How the principal soil was read. Always by machine: an engineer confirms it. */
export interface SoilReading {
  readonly soil: PrincipalSoil;
  readonly madeGround: boolean;
  readonly organic: boolean;
  readonly readFrom: "legend code" | "description" | "nothing";
  readonly machineRead: true;
}

/** One described interval of one hole. */
export interface GroundStratum extends AgsSource {
  readonly hole: string;
  readonly top_m: number | null;
  readonly base_m: number | null;
  /** Verbatim. */
  readonly description: string;
  readonly legendCode: string;
  readonly geologyCode: string;
  readonly secondGeologyCode: string;
  readonly lexiconCode: string;
  readonly formation: string;
  /** GEOL_STAT: the stratum reference. */
  readonly reference: string;
  readonly remarks: string;
  readonly reading: SoilReading;
}

/** One increment of a standard penetration test. */
export interface SptIncrement {
  readonly blows: number | null;
  readonly penetration_mm: number | null;
}

/** One standard penetration test: N, refusal and the words of the log are three different things. */
export interface GroundSpt extends AgsSource {
  readonly hole: string;
  readonly depth_m: number | null;
  /** S split spoon, C cone, or as written. */
  readonly kind: string;
  /** N over 300 mm after seating; null on refusal or when not stated. */
  readonly blowCount: number | null;
  /** True when the full 300 mm was not driven: `mainBlows` for `mainPenetration_mm`. */
  readonly refusal: boolean;
  readonly mainBlows: number | null;
  readonly mainPenetration_mm: number | null;
  readonly seatingBlows: number | null;
  readonly seatingPenetration_mm: number | null;
  /** Six at most: two of seating, four of the main drive; empty when the file gives none. */
  readonly increments: readonly SptIncrement[];
  readonly energyRatio_percent: number | null;
  readonly n60: number | null;
  readonly selfWeightPenetration_mm: number | null;
  /** ISPT_REP as written. */
  readonly reportText: string;
  readonly casing_m: number | null;
  /** Depth to water; "Dry" stays a word. */
  readonly water: TextOrNumber;
  readonly inRock: boolean | null;
  readonly hammer: string;
  readonly remarks: string;
}

/** The level of water some minutes after a strike. */
export interface GroundRise extends AgsSource {
  readonly hole: string;
  readonly strikeDepth_m: number | null;
  readonly minutes: number | null;
  /** Depth below ground level; words stay words. */
  readonly depth: TextOrNumber;
  readonly remarks: string;
}

/** One water strike while boring, with its rises. */
export interface GroundStrike extends AgsSource {
  readonly hole: string;
  /** Null when the file gives a strike without a depth: the remark then says what was seen. */
  readonly depth_m: number | null;
  readonly depthText: string;
  readonly at: string;
  readonly casing_m: number | null;
  readonly sealed_m: number | null;
  readonly rises: readonly GroundRise[];
  readonly remarks: string;
}

/** What the import guard compares before anything is accepted. */
export interface GroundIdentity {
  readonly projectId: string;
  readonly projectName: string;
  readonly issueNumber: string;
  readonly issueDate: string;
  readonly dataStatus: string;
  readonly producer: string;
  readonly holeCount: number;
  readonly holeNames: readonly string[];
  /** Box of the national coordinates; null when no hole has any. */
  readonly nationalBox: PlanBox | null;
  readonly localBox: PlanBox | null;
  /** Number of holes per LOCA_STAT, "" for those without. */
  readonly holeStatuses: Readonly<Record<string, number>>;
  readonly nationalGrids: readonly string[];
  readonly verticalDatums: readonly string[];
}

/** A box on plan in metres. */
export interface PlanBox {
  readonly minEasting_m: number;
  readonly minNorthing_m: number;
  readonly maxEasting_m: number;
  readonly maxNorthing_m: number;
}

/** All that the register takes from one AGS file, each row with group and line; the rest stays as raw groups. */
export interface Ground {
  readonly project: GroundProject | null;
  readonly transmittal: GroundTransmittal | null;
  readonly abbreviations: readonly GroundAbbreviation[];
  readonly holes: readonly GroundHole[];
  readonly strata: readonly GroundStratum[];
  readonly spts: readonly GroundSpt[];
  readonly strikes: readonly GroundStrike[];
  readonly identity: GroundIdentity;
  /** Groups that the register does not model, kept as they came. */
  readonly otherGroups: readonly AgsGroup[];
  readonly findings: readonly AgsFinding[];
}
