import type { AgsFinding, AgsReport } from "./file-model";
import type { SptIncrement } from "./ground-model";
import type { WrittenCharacters } from "./plain-text";

/** What is said of the project. */
export interface WrittenProject {
  readonly projectId: string;
  readonly name: string;
  readonly location?: string;
  readonly client?: string;
  readonly contractor?: string;
  readonly engineer?: string;
  readonly memo?: string;
}

/** What is said of the issue; date as yyyy-mm-dd. */
export interface WrittenTransmittal {
  readonly issueNumber: string;
  readonly date: string;
  readonly producer: string;
  readonly status: string;
  readonly recipient: string;
  readonly description?: string;
  readonly remarks?: string;
}

/** One exploratory hole to write. */
export interface WrittenHole {
  readonly name: string;
  readonly kind?: string;
  readonly status?: string;
  readonly easting_m?: number | null;
  readonly northing_m?: number | null;
  readonly nationalGrid?: string;
  readonly localEasting_m?: number | null;
  readonly localNorthing_m?: number | null;
  readonly localGrid?: string;
  readonly groundLevel_m?: number | null;
  readonly localLevel_m?: number | null;
  readonly localDatum?: string;
  readonly verticalDatum?: string;
  readonly finalDepth_m?: number | null;
  readonly startDate?: string | null;
  readonly endDate?: string | null;
  readonly purpose?: string;
  readonly termination?: string;
  readonly originalName?: string;
  readonly remarks?: string;
}

/** One stratum to write. */
export interface WrittenStratum {
  readonly hole: string;
  readonly top_m: number;
  readonly base_m: number | null;
  readonly description: string;
  readonly legendCode?: string;
  readonly geologyCode?: string;
  readonly secondGeologyCode?: string;
  readonly lexiconCode?: string;
  readonly reference?: string;
  readonly formation?: string;
  readonly remarks?: string;
}

/** One standard penetration test to write. */
export interface WrittenSpt {
  readonly hole: string;
  readonly depth_m: number;
  readonly kind?: string;
  readonly blowCount: number | null;
  readonly refusal?: boolean;
  readonly mainBlows?: number | null;
  readonly mainPenetration_mm?: number | null;
  readonly seatingBlows?: number | null;
  readonly seatingPenetration_mm?: number | null;
  readonly increments?: readonly SptIncrement[];
  readonly energyRatio_percent?: number | null;
  readonly selfWeightPenetration_mm?: number | null;
  readonly reportText?: string;
  readonly casing_m?: number | null;
  /** Depth to water, or a word such as "Dry". */
  readonly waterText?: string;
  readonly inRock?: boolean | null;
  readonly hammer?: string;
  readonly remarks?: string;
}

/** One water strike to write, with its rises. */
export interface WrittenStrike {
  readonly hole: string;
  readonly depth_m: number | null;
  readonly at?: string;
  readonly casing_m?: number | null;
  readonly sealed_m?: number | null;
  readonly remarks?: string;
  readonly rises?: readonly {
    readonly minutes: number | null;
    readonly depth_m: number | null;
    readonly remarks?: string;
  }[];
}

/** One sample to write. */
export interface WrittenSample {
  readonly hole: string;
  readonly top_m: number | null;
  readonly reference?: string;
  readonly kind?: string;
  readonly sampleId?: string;
  readonly base_m?: number | null;
  readonly takenAt?: string;
  readonly description?: string;
  readonly remarks?: string;
}

/** One monitoring installation to write. */
export interface WrittenInstallation {
  readonly hole: string;
  readonly name: string;
  readonly depth_m: number | null;
  readonly date?: string | null;
  readonly kind?: string;
  readonly details?: string;
  readonly responseTop_m?: number | null;
  readonly responseBase_m?: number | null;
  readonly remarks?: string;
}

/** One reading of an installation to write; the value may be a word. */
export interface WrittenReading {
  readonly hole: string;
  readonly installation: string;
  readonly depth_m: number | null;
  readonly at: string;
  readonly kind: string;
  readonly reference?: string;
  readonly instrument?: string;
  readonly value: string;
  readonly unit: string;
  readonly method?: string;
  readonly remarks?: string;
}

/** One file that goes with the data, in FILE/<set>/<name>. */
export interface WrittenFile {
  readonly set: string;
  readonly name: string;
  readonly description?: string;
  readonly format?: string;
  readonly kind?: string;
  readonly date?: string;
  readonly remarks?: string;
}

/** A group of the user's own, declared in DICT (rule 18), such as bearing values and the footings on them. */
export interface WrittenUserGroup {
  /** Four capitals or digits that no group of the dictionary has. */
  readonly name: string;
  readonly description: string;
  /** The parent group, "" for none. */
  readonly parent: string;
  readonly headings: readonly {
    readonly name: string;
    readonly type: string;
    readonly unit: string;
    readonly description: string;
    readonly key?: boolean;
    readonly required?: boolean;
  }[];
  /** One item per heading. */
  readonly rows: readonly (readonly (string | number | null)[])[];
}

/** All that goes into one AGS 4 file. */
export interface AgsExport {
  readonly project: WrittenProject;
  readonly transmittal: WrittenTransmittal;
  /** What codes mean that are not among the usual ones; the code itself is written where nothing is known. */
  readonly abbreviations?: readonly {
    readonly heading: string;
    readonly code: string;
    readonly description: string;
  }[];
  readonly holes?: readonly WrittenHole[];
  readonly strata?: readonly WrittenStratum[];
  readonly spts?: readonly WrittenSpt[];
  readonly strikes?: readonly WrittenStrike[];
  readonly samples?: readonly WrittenSample[];
  readonly installations?: readonly WrittenInstallation[];
  readonly readings?: readonly WrittenReading[];
  readonly files?: readonly WrittenFile[];
  readonly userGroups?: readonly WrittenUserGroup[];
  readonly characters?: WrittenCharacters;
}

/** A written file: its bytes, what had to be changed to write it, and the report of reading it back. */
export interface AgsWriting {
  readonly bytes: Uint8Array;
  readonly text: string;
  /** Characters without a like, dates that do not fit, numbers that were rounded. */
  readonly findings: readonly AgsFinding[];
  /** The file's own report; a file with an error in it must not be handed out. */
  readonly report: AgsReport;
}
