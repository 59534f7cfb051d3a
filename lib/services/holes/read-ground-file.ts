import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { GroundPreview } from "@/lib/contracts/ground";
import { groundFromAgs } from "@/lib/exchange/ags/ground";
import type { Ground } from "@/lib/exchange/ags/ground-model";
import { readAgs } from "@/lib/exchange/ags/read";
import { validateAgs } from "@/lib/exchange/ags/validate";
import { open } from "@/lib/storage/client";
import { type Context, sha256 } from "../context";
import { Conflict, Invalid } from "../errors";
import { heldLogs } from "./held-logs";
import { fingerprintOf, logsFromGround } from "./logs-from-ground";

/** Largest AGS file that is read whole; real ones stay below 5 MB. */
const LARGEST_BYTES = 100 * 1024 * 1024;
const LISTED_FINDINGS = 500;
/** Farther than this from everything held, a file is asked about: it may be another project's. */
const FAR_m = 5_000;

export type ReadGround = { bytes: Uint8Array; sha256: string; ground: Ground; preview: GroundPreview };

/** Reads an uploaded AGS file whole, from the waiting area. */
export async function bytesOf(objectKey: string, size_bytes: number): Promise<Uint8Array> {
  if (size_bytes > LARGEST_BYTES)
    throw new Invalid("The file is larger than 100 MB and is not read as ground data.", {
      file: "Split it by area.",
    });
  const object = await open(objectKey);
  if (!object) throw new Conflict("The file has not arrived in the store. Please send it again.");
  const parts: Uint8Array[] = [];
  let size = 0;
  for await (const part of object.bytes) {
    size += part.byteLength;
    if (size > size_bytes) break;
    parts.push(part);
  }
  if (size !== size_bytes)
    throw new Invalid("The file that arrived has another size than the one announced.", {
      file: "Please send it again.",
    });
  return Buffer.concat(parts);
}

/**
 * Reads and judges an AGS file against what the project holds: what is new, changed, unchanged or missing from it,
 * every finding, and what has to be confirmed. Writes nothing. A file that cannot be taken says so in one sentence.
 */
export async function readGroundFile(
  tx: Transaction,
  context: Context,
  file: { bytes: Uint8Array; fileName: string; dataIssueId: string },
) {
  const read = readAgs(file.bytes);
  const report = validateAgs(read);
  const ground = groundFromAgs(read);
  const grid = await siteGridOf(tx, context);
  const logs = logsFromGround(ground, grid, file.dataIssueId);
  const held = await heldLogs(tx, context);
  const findings = [...report.findings, ...ground.findings].map((finding) => ({
    rule: finding.rule,
    line: finding.line,
    group: finding.group ?? "",
    heading: finding.heading ?? "",
    severity: finding.severity,
    message: finding.message,
  }));
  const names = new Set<string>();
  const twice = logs.filter((log) => names.size === names.add(log.name).size).map((log) => log.name);
  const added = logs.filter((log) => !held.has(log.name));
  const changed = logs.filter((log) => {
    const before = held.get(log.name);
    return before !== undefined && before.fingerprint !== fingerprintOf(log);
  });
  const missing = [...held.keys()].filter((name) => !names.has(name));
  const preview: GroundPreview = {
    sha256: sha256(file.bytes),
    fileName: file.fileName,
    edition: report.edition,
    statedEdition: report.statedEdition,
    refused: refusalOf(read, logs.length, twice),
    identity: {
      projectId: ground.identity.projectId,
      projectName: ground.identity.projectName,
      issueNumber: ground.identity.issueNumber,
      issueDate: ground.identity.issueDate,
      dataStatus: ground.identity.dataStatus,
      producer: ground.identity.producer,
    },
    counts: {
      holes: logs.length,
      strata: logs.reduce((sum, log) => sum + log.strata.length, 0),
      spts: logs.reduce((sum, log) => sum + log.spts.length, 0),
      strikes: logs.reduce((sum, log) => sum + log.strikes.length, 0),
      otherGroups: ground.otherGroups.map((group) => group.name),
    },
    holes: {
      added: added.map((log) => log.name),
      changed: changed.map((log) => log.name),
      unchanged: logs.length - added.length - changed.length,
      missing,
      unlocated: logs.filter((log) => log.row.easting_m === null).length,
      withoutLevel: logs.filter((log) => log.row.ground_level_m === null).length,
    },
    findings: findings.slice(0, LISTED_FINDINGS),
    findingCounts: count(findings.map((finding) => finding.severity)),
    questions: await questionsAbout(tx, context, ground, logs, held),
  };
  return { read, ground, logs: [...added, ...changed], held, findings, preview };
}

const count = (words: string[]): Record<string, number> => {
  const counts: Record<string, number> = {};
  for (const word of words) counts[word] = (counts[word] ?? 0) + 1;
  return counts;
};

function refusalOf(read: ReturnType<typeof readAgs>, holes: number, twice: string[]): string | null {
  if (read.kind === "ags3")
    return "This is a file of the older edition 3 of the AGS data format. The register reads edition 4: ask the sender for an AGS 4 file.";
  if (read.kind !== "ags4") return read.stopped ?? "This is not an AGS 4 file.";
  if (read.stopped) return read.stopped;
  if (twice.length > 0)
    return `The file has more than one hole under the same name: ${[...new Set(twice)].slice(0, 10).join(", ")}.`;
  if (holes === 0) return "The file has no exploratory hole (group LOCA) that can be taken.";
  return null;
}

async function siteGridOf(tx: Transaction, context: Context) {
  const found = await tx.execute<{ e: number; n: number; rotation: number; scale: number }>(sql`
    select grid_origin_easting_m as e, grid_origin_northing_m as n, grid_rotation_deg as rotation, grid_scale as scale
    from project where id = ${context.projectId}`);
  const row = found.rows[0];
  return {
    originEasting_m: row?.e ?? 0,
    originNorthing_m: row?.n ?? 0,
    rotation_deg: row?.rotation ?? 0,
    scale: row?.scale ?? 1,
  };
}

/** The guard against the wrong project's file and against draft data taken for final. */
async function questionsAbout(
  tx: Transaction,
  context: Context,
  ground: Ground,
  logs: { name: string; row: { easting_m: number | null; northing_m: number | null } }[],
  held: Awaited<ReturnType<typeof heldLogs>>,
) {
  const questions: { code: string; sentence: string }[] = [];
  const { projectId, projectName, dataStatus, issueNumber } = ground.identity;
  const earlier = await tx.execute<{ file_project_id: string }>(sql`
    select distinct file_project_id from data_issue where project_id = ${context.projectId} and file_project_id <> ''`);
  if (earlier.rows.length > 0 && !earlier.rows.some((row) => row.file_project_id === projectId))
    questions.push({
      code: "other-project",
      sentence: `The file belongs to project ${projectId} “${projectName}”; earlier files said ${earlier.rows.map((row) => row.file_project_id).join(", ")}.`,
    });
  if (held.size > 0 && logs.length > 0 && !logs.some((log) => held.has(log.name)))
    questions.push({
      code: "no-hole-matches",
      sentence: `None of its ${logs.length} holes is among the ${held.size} that the project holds.`,
    });
  const centre = middle([...held.values()]);
  const file = middle(logs.map((log) => log.row));
  if (centre && file) {
    const apart_m = Math.hypot(centre[0] - file[0], centre[1] - file[1]);
    if (apart_m > FAR_m)
      questions.push({
        code: "far-away",
        sentence: `Its holes lie ${(apart_m / 1000).toFixed(1)} km from those that the project holds.`,
      });
  }
  if (/prelim|draft|internal/i.test(dataStatus))
    questions.push({
      code: "not-final",
      sentence: `The file says of itself that its data are “${dataStatus}”${issueNumber ? ` (issue ${issueNumber})` : ""}: not for final design.`,
    });
  return questions;
}

function middle(points: { easting_m: number | null; northing_m: number | null }[]): [number, number] | null {
  const placed = points.filter((point) => point.easting_m !== null && point.northing_m !== null);
  if (placed.length === 0) return null;
  const sorted = (values: number[]) =>
    values.sort((one, other) => one - other)[Math.floor(values.length / 2)] as number;
  return [
    sorted(placed.map((p) => p.easting_m as number)),
    sorted(placed.map((p) => p.northing_m as number)),
  ];
}
