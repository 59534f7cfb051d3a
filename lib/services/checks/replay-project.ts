import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingCheckResult } from "@/lib/check/input";
import { ENGINE_VERSION } from "@/lib/check/version";
import type { CheckSnapshot } from "@/lib/contracts/checks";
import type { ProjectId } from "@/lib/contracts/ids";
import { type Difference, replayCheck } from "./replay";

/** Checks are read this many at a time, so that memory does not grow with the register. */
const BATCH = 500;
/** How many checks that differ are named in full. */
const NAMED = 20;

export type ProjectReplay = {
  checks: number;
  /** Made with this engine and yet different: an error of ours, or a record that was tampered with. */
  broken: number;
  /** Made with an earlier engine whose result an engine change has altered: reported, never overwritten. */
  altered: number;
  named: { mark: string; seq: number; engineVersion: string; differences: Difference[] }[];
};

/** Computes every stored check of the project again from its snapshot and compares digit for digit. */
export async function replayProject(tx: Transaction, projectId: ProjectId): Promise<ProjectReplay> {
  const told: ProjectReplay = { checks: 0, broken: 0, altered: 0, named: [] };
  let after = 0;
  for (;;) {
    const { rows } = await tx.execute<Stored>(sql`
      select c.seq::float8 as seq, f.mark, c.engine_version as "engineVersion", c.snapshot, c.result, c.verdict,
        c.utilisation, c.utilisation_bearing as "utilisationBearing", c.required_net_kpa as "requiredNet_kPa",
        c.max_pressure_kpa as "maxPressure_kPa", c.net_allowable_kpa as "netAllowable_kPa"
      from footing_check c join footing f on f.project_id = c.project_id and f.id = c.footing_id
      where c.project_id = ${projectId} and c.seq > ${after} order by c.seq limit ${BATCH}`);
    for (const row of rows) {
      told.checks += 1;
      const differences = [...replayCheck(row), ...columnsAgainst(row)];
      if (differences.length === 0) continue;
      if (row.engineVersion === ENGINE_VERSION) told.broken += 1;
      else told.altered += 1;
      if (told.named.length < NAMED)
        told.named.push({ mark: row.mark, seq: row.seq, engineVersion: row.engineVersion, differences });
    }
    const last = rows.at(-1);
    if (!last || rows.length < BATCH) return told;
    after = last.seq;
  }
}

type Stored = {
  seq: number;
  mark: string;
  engineVersion: string;
  snapshot: CheckSnapshot;
  result: FootingCheckResult;
  verdict: string;
  utilisation: number | null;
  utilisationBearing: number | null;
  requiredNet_kPa: number | null;
  maxPressure_kPa: number | null;
  netAllowable_kPa: number | null;
};

/** The columns that lists and filters read must say what the stored result says. */
function columnsAgainst(row: Stored): Difference[] {
  const columns = [
    "verdict",
    "utilisation",
    "utilisationBearing",
    "requiredNet_kPa",
    "maxPressure_kPa",
  ] as const;
  const found: Difference[] = [];
  for (const column of columns) {
    const inResult = row.result[column] ?? null;
    if (row[column] !== inResult) found.push({ at: `column ${column}`, stored: row[column], now: inResult });
  }
  const { value } = row.snapshot.input;
  const pressure = value.kind === "single" ? value.netAllowable_kPa : null;
  if (row.netAllowable_kPa !== pressure)
    found.push({ at: "column netAllowable_kPa", stored: row.netAllowable_kPa, now: pressure });
  return found;
}
