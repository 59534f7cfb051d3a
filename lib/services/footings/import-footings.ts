import {
  type AcceptFootingImportInput,
  acceptFootingImportInput,
  type ImportAnswer,
  type ImportPreview,
  type PreviewFootingImportInput,
  previewFootingImportInput,
} from "@/lib/contracts/footings";
import { readFootingsCsv } from "@/lib/exchange/csv/footings";
import type { CsvFinding, CsvReading, FootingRow } from "@/lib/exchange/csv/model";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject, sha256 } from "../context";
import { Conflict, Invalid } from "../errors";
import { faultPoint } from "../faults";
import { parse } from "../parse";
import { type FootingPlan, planFootingImport } from "./import-plan";
import { gatherRegister, holdRegister } from "./import-register";
import { storeFootings } from "./store-footings";

/** How many rows and findings an answer carries; the counts say how many there are. */
export const SHOWN = 2000;

/** Shows what a file of footings would do to the register. Nothing is written. */
export async function previewFootingImport(
  context: Context,
  given: PreviewFootingImportInput,
): Promise<ImportPreview> {
  assertMay(context, "footing:write");
  const { content } = parse(previewFootingImportInput, given);
  const reading = readFootingsCsv(content);
  return inProject(context, async (tx) => {
    const plan = planFootingImport(reading, await gatherRegister(tx, context));
    return previewOf(reading, plan, fingerprintOf(content, plan));
  });
}

/** Takes a file of footings into the register, whole or not at all, as long as the register is as the preview showed it. */
export async function acceptFootingImport(
  context: Context,
  given: AcceptFootingImportInput,
): Promise<ImportAnswer> {
  assertMay(context, "footing:write");
  const { content, fileName, fingerprint, leaveOutErrors, reason } = parse(acceptFootingImportInput, given);
  const reading = readFootingsCsv(content);
  if (reading.refused) throw new Invalid(reading.refused, { content: reading.refused });

  return inProject(context, async (tx) => {
    await holdRegister(tx, context);
    const plan = planFootingImport(reading, await gatherRegister(tx, context));
    if (fingerprintOf(content, plan) !== fingerprint)
      throw new Conflict("The register has changed since the preview. Look at what the file would do now.");
    if (plan.inError > 0 && !leaveOutErrors)
      throw new Invalid(
        `${plan.inError} ${plan.inError === 1 ? "row is" : "rows are"} in error. Nothing was written.`,
        {
          content: "Correct the rows in error, or leave them out.",
        },
      );
    const added = plan.rows.filter(({ what }) => what === "new");
    const changed = plan.rows.filter(({ what }) => what === "changed");
    await storeFootings(tx, context, { added, changed, source: fileName });
    await faultPoint("import:footings");
    const checked = changed.flatMap(({ before }) => (before?.hasCheck ? [before.id] : []));
    if (checked[0])
      await recordChange(tx, context, {
        kind: "footing-changed",
        subjectId: checked[0],
        title: `${checked.length} checked ${checked.length === 1 ? "footing" : "footings"} revised by import${fileName ? ` of ${fileName}` : ""}`,
        reason: reason || `Imported${fileName ? ` from ${fileName}` : ""}.`,
        footingIds: checked,
      });
    const answer = {
      new: added.length,
      changed: changed.length,
      unchanged: plan.rows.length - added.length - changed.length,
      leftOut: plan.inError,
    };
    await audit(tx, context, {
      verb: "footing:import",
      subject: `project/${context.projectId}`,
      detail: {
        fileName,
        sha256: sha256(content),
        ...answer,
        reason,
        marks: changed.map(({ mark }) => mark),
      },
    });
    return answer;
  });
}

/** What stands for one state of the register against one file: any difference in either gives another. */
function fingerprintOf(content: string, plan: FootingPlan): string {
  const rows = plan.rows.map(({ mark, what, before, changes }) => [
    mark,
    what,
    before?.revisionId ?? null,
    changes,
  ]);
  return sha256(JSON.stringify([sha256(content), rows, plan.inError]));
}

/** The preview that an import shows, whatever it is of. */
export function previewOf(
  reading: Pick<CsvReading<FootingRow>, "refused" | "rowCount" | "columns">,
  plan: {
    rows: readonly {
      row: number;
      mark: string;
      what: "new" | "changed" | "unchanged";
      changes: ImportPreview["rows"][number]["changes"];
    }[];
    findings: readonly CsvFinding[];
    inError: number;
    missing: readonly string[];
  },
  fingerprint: string,
): ImportPreview {
  const count = (what: string) => plan.rows.filter((row) => row.what === what).length;
  return {
    refused: reading.refused,
    fingerprint,
    rowCount: reading.rowCount,
    counts: {
      new: count("new"),
      changed: count("changed"),
      unchanged: count("unchanged"),
      inError: plan.inError,
      missing: plan.missing.length,
    },
    rows: plan.rows
      .filter(({ what }) => what !== "unchanged")
      .slice(0, SHOWN)
      .map(({ row, mark, what, changes }) => ({ row, mark, what, changes })),
    findings: [...plan.findings].sort(bySeverity).slice(0, SHOWN),
    findingCount: plan.findings.length,
    missing: plan.missing.slice(0, SHOWN),
    columns: { ...reading.columns },
  };
}

const rank = { error: 0, warning: 1, note: 2 };
const bySeverity = (a: CsvFinding, b: CsvFinding): number =>
  rank[a.severity] - rank[b.severity] || (a.row ?? 0) - (b.row ?? 0);
