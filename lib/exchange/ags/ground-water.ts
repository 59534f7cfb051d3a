import { columnsFor } from "./columns";
import type { AgsGroup } from "./file-model";
import type { FindingList } from "./finding-list";
import type { GroundHole, GroundRise, GroundStrike } from "./ground-model";
import { isKnownHole } from "./ground-strata";

/** The water strikes of WSTG, each with the rises that WSTD gives for it. Words stay words: "Dry" is never 0. */
export function strikesOf(
  groups: readonly AgsGroup[],
  holes: ReadonlyMap<string, GroundHole>,
  findings: FindingList,
): GroundStrike[] {
  const rises = risesOf(groups, holes, findings);
  const strikes: GroundStrike[] = [];
  for (const columns of columnsFor(groups, "WSTG", findings)) {
    for (const row of columns.rows()) {
      const hole = columns.text(row, "LOCA_ID");
      if (!isKnownHole(columns, row, hole, holes)) continue;
      const depthText = columns.text(row, "WSTG_DPTH");
      const depth = columns.textOrNumber(row, "WSTG_DPTH", "m").number;
      if (depth === null) {
        const said = depthText === "" ? "has no depth" : `has "${depthText}" for its depth`;
        columns.report(
          "warning",
          row.line,
          "WSTG_DPTH",
          `A water strike in ${hole} ${said}; its remark is kept.`,
        );
      }
      const key = keyOfStrike(hole, depth);
      const own = depth === null ? [] : (rises.get(key) ?? []);
      rises.delete(key);
      strikes.push({
        group: "WSTG",
        line: row.line,
        hole,
        depth_m: depth,
        depthText,
        at: columns.text(row, "WSTG_DTIM"),
        casing_m: columns.number(row, "WSTG_CAS", "m"),
        sealed_m: columns.number(row, "WSTG_SEAL", "m"),
        rises: own.sort((a, b) => (a.minutes ?? 0) - (b.minutes ?? 0)),
        remarks: columns.verbatim(row, "WSTG_REM"),
      });
    }
  }
  for (const { line, hole } of [...rises.values()].flat()) {
    const message = `This rise in ${hole} belongs to no water strike of the file and was left out.`;
    findings.add("ground", "error", { group: "WSTD", line, heading: "WSTG_DPTH" }, message);
  }
  return strikes;
}

function risesOf(
  groups: readonly AgsGroup[],
  holes: ReadonlyMap<string, GroundHole>,
  findings: FindingList,
): Map<string, GroundRise[]> {
  const rises = new Map<string, GroundRise[]>();
  for (const columns of columnsFor(groups, "WSTD", findings)) {
    for (const row of columns.rows()) {
      const hole = columns.text(row, "LOCA_ID");
      if (!isKnownHole(columns, row, hole, holes)) continue;
      const strikeDepth_m = columns.number(row, "WSTG_DPTH", "m");
      const key = keyOfStrike(hole, strikeDepth_m);
      const rise: GroundRise = {
        group: "WSTD",
        line: row.line,
        hole,
        strikeDepth_m,
        minutes: columns.number(row, "WSTD_NMIN", "min"),
        depth: columns.textOrNumber(row, "WSTD_POST", "m"),
        remarks: columns.verbatim(row, "WSTD_REM"),
      };
      const known = rises.get(key);
      if (known) known.push(rise);
      else rises.set(key, [rise]);
    }
  }
  return rises;
}

/** Strikes and rises are matched by the number of their depth: 2.9 and 2.90 are one depth. */
function keyOfStrike(hole: string, depth_m: number | null): string {
  return JSON.stringify([hole, depth_m]);
}
