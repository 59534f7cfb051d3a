import { columnsFor, type GroupColumns } from "./columns";
import type { AgsGroup, AgsRow } from "./file-model";
import type { FindingList } from "./finding-list";
import type { GroundHole, GroundStratum } from "./ground-model";
import { readPrincipalSoil } from "./principal-soil";

/** Depths are given to the centimetre: less than half of one between two of them is rounding. */
const tolerance_m = 0.005;

/** The strata of the GEOL group, with findings where intervals leave gaps, overlap, are reversed or run too deep. */
export function strataOf(
  groups: readonly AgsGroup[],
  holes: ReadonlyMap<string, GroundHole>,
  findings: FindingList,
): GroundStratum[] {
  const strata: GroundStratum[] = [];
  for (const columns of columnsFor(groups, "GEOL", findings)) {
    for (const row of columns.rows()) {
      const hole = columns.text(row, "LOCA_ID");
      if (!isKnownHole(columns, row, hole, holes)) continue;
      strata.push(readStratum(columns, row, hole));
    }
  }
  checkIntervals(strata, holes, findings);
  return strata;
}

/** True when the hole of a row is in LOCA; otherwise the row is reported, to be left out. */
export function isKnownHole(
  columns: GroupColumns,
  row: AgsRow,
  hole: string,
  holes: ReadonlyMap<string, GroundHole>,
): boolean {
  if (holes.has(hole)) return true;
  const named = hole === "" ? "The row names no hole" : `The hole ${hole} is not in LOCA`;
  columns.report("error", row.line, "LOCA_ID", `${named}; the row was left out.`);
  return false;
}

function readStratum(columns: GroupColumns, row: AgsRow, hole: string): GroundStratum {
  const text = (heading: string) => columns.text(row, heading);
  const description = columns.verbatim(row, "GEOL_DESC");
  const legendCode = text("GEOL_LEG");
  return {
    group: "GEOL",
    line: row.line,
    hole,
    top_m: columns.number(row, "GEOL_TOP", "m"),
    base_m: columns.number(row, "GEOL_BASE", "m"),
    description,
    legendCode,
    geologyCode: text("GEOL_GEOL"),
    secondGeologyCode: text("GEOL_GEO2"),
    lexiconCode: text("GEOL_BGS"),
    formation: text("GEOL_FORM"),
    reference: text("GEOL_STAT"),
    remarks: text("GEOL_REM"),
    reading: readPrincipalSoil(legendCode, description),
  };
}

function checkIntervals(
  strata: readonly GroundStratum[],
  holes: ReadonlyMap<string, GroundHole>,
  findings: FindingList,
): void {
  const byHole = new Map<string, GroundStratum[]>();
  for (const stratum of strata) {
    const known = byHole.get(stratum.hole);
    if (known) known.push(stratum);
    else byHole.set(stratum.hole, [stratum]);
  }
  for (const [name, own] of byHole) {
    for (const stratum of own) checkOne(stratum, holes.get(name)?.finalDepth_m ?? null, findings);
    const ordered = own
      .filter(({ top_m }) => top_m !== null)
      .sort((a, b) => (a.top_m ?? 0) - (b.top_m ?? 0) || (a.base_m ?? Infinity) - (b.base_m ?? Infinity));
    for (const [index, stratum] of ordered.entries()) {
      const above = ordered[index - 1];
      if (above) checkPair(above, stratum, findings);
    }
  }
}

function checkOne(stratum: GroundStratum, finalDepth_m: number | null, findings: FindingList): void {
  const { top_m, base_m, hole, line } = stratum;
  const add = (severity: "error" | "warning", heading: string, message: string) =>
    findings.add("ground", severity, { group: "GEOL", line, heading }, message);
  if (top_m === null) {
    add("error", "GEOL_TOP", `A stratum of ${hole} has no depth of its top.`);
    return;
  }
  if (top_m < 0) add("error", "GEOL_TOP", `A stratum of ${hole} begins above ground, at ${depth(top_m)}.`);
  if (base_m === null) {
    add("warning", "GEOL_BASE", `The stratum of ${hole} from ${depth(top_m)} has no base.`);
    return;
  }
  if (base_m < top_m) {
    add(
      "error",
      "GEOL_BASE",
      `A stratum of ${hole} is upside down: top ${depth(top_m)}, base ${depth(base_m)}.`,
    );
  } else if (base_m === top_m) {
    add("warning", "GEOL_BASE", `A stratum of ${hole} at ${depth(top_m)} has no thickness.`);
  }
  if (finalDepth_m !== null && base_m > finalDepth_m + tolerance_m) {
    add(
      "warning",
      "GEOL_BASE",
      `A stratum of ${hole} ends at ${depth(base_m)}, below the final depth ${depth(finalDepth_m)}.`,
    );
  }
}

function checkPair(above: GroundStratum, below: GroundStratum, findings: FindingList): void {
  if (above.base_m === null || below.top_m === null || above.top_m === null || above.base_m < above.top_m)
    return;
  const at = { group: "GEOL", line: below.line, heading: "GEOL_TOP" };
  const between = below.top_m - above.base_m;
  if (between > tolerance_m) {
    const message = `Between ${depth(above.base_m)} and ${depth(below.top_m)} the log of ${below.hole} has a gap.`;
    findings.add("ground", "warning", at, message);
  } else if (between < -tolerance_m) {
    const message = `The strata of ${below.hole} overlap: ${depth(below.top_m)} lies above ${depth(above.base_m)}.`;
    findings.add("ground", "warning", at, message);
  }
}

function depth(value_m: number): string {
  return `${value_m.toFixed(2)} m`;
}
