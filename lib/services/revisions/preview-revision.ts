import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { RevisionPreview } from "@/lib/contracts/changes";
import type { ValueId, ValueRevisionId } from "@/lib/contracts/ids";
import { previewRevisionInput } from "@/lib/contracts/values";
import type { JudgedTerms } from "../changes/judge";
import { gatherTerms } from "../checks/gather";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";
import type { DraftKept } from "../values/draft-row";
import { readDraft } from "../values/read-draft";
import { previewByRunning } from "./preview-by-running";
import { previewFromRequired } from "./preview-from-required";

/**
 * What a draft would do to the footings linked to its value, without writing anything. While it states the same loads,
 * water, weights and factors as the revision that the checks stand on, the answer comes from their stored required
 * values; else every check is run again. Without a draft, today's value is shown against itself or against a pressure to
 * try.
 */
export async function previewRevision(
  context: Context,
  given: { valueId: string; netAllowable_kPa?: number | string },
): Promise<RevisionPreview> {
  assertMay(context, "project:read");
  const { valueId, netAllowable_kPa } = parse(previewRevisionInput, given);

  return inProject(context, async (tx) => {
    const { soil, today, currentRevisionId, draft } = await readState(tx, context, valueId);
    const current = currentRevisionId
      ? ((await gatherTerms(tx, context, [currentRevisionId])).get(currentRevisionId) ?? null)
      : null;
    const trial = trialOf(draft, { soil, today }, current, netAllowable_kPa);
    const at = { tx, context, valueId, currentNet_kPa: current?.netAllowable_kPa ?? null };
    if (!trial) return previewFromRequired(at, null);
    const sameDemand = current !== null && demandOf(current) === demandOf(trial);
    const pinnedElsewhere = sameDemand && (await standElsewhere(tx, context, valueId, currentRevisionId));
    return sameDemand && !pinnedElsewhere ? previewFromRequired(at, trial) : previewByRunning(at, trial);
  });
}

async function readState(tx: Transaction, context: Context, valueId: ValueId) {
  const { rows } = await tx.execute<{
    soil: string;
    today: string;
    currentRevisionId: ValueRevisionId | null;
    draft: DraftKept | null;
  }>(sql`
    select u.soil, to_char(now() at time zone 'UTC', 'YYYY-MM-DD') as today,
      v.current_revision_id as "currentRevisionId", d.content as draft
    from bearing_value v
    join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
    left join bearing_value_draft d on d.project_id = v.project_id and d.value_id = v.id
    where v.project_id = ${context.projectId} and v.id = ${valueId}`);
  const state = rows[0];
  if (!state) throw new NotFound("There is no such bearing value in this project.");
  return state;
}

/** The terms to try: the draft's where it can be read, today's where it cannot yet; null while there is no pressure at all. */
function trialOf(
  draft: DraftKept | null,
  ground: { soil: string; today: string },
  current: JudgedTerms | null,
  netAllowable_kPa: number | undefined,
): JudgedTerms | null {
  const read = draft ? readDraft(draft.fields, ground) : null;
  const stated = read?.terms ?? {};
  const pressure = netAllowable_kPa ?? read?.netAllowable_kPa ?? current?.netAllowable_kPa ?? null;
  const soilUnitWeight_kNm3 = stated.soilUnitWeight_kNm3 ?? current?.soilUnitWeight_kNm3;
  if (pressure === null || soilUnitWeight_kNm3 === undefined) return null;
  const from = <Name extends keyof JudgedTerms>(
    name: Name,
    otherwise: JudgedTerms[Name],
  ): JudgedTerms[Name] => (name in stated ? (stated as JudgedTerms)[name] : (current?.[name] ?? otherwise));
  return {
    reference: "",
    code: "draft",
    kind: "single",
    table: null,
    parameters: null,
    netAllowable_kPa: pressure,
    soilUnitWeight_kNm3,
    comparedWith: from("comparedWith", "maximum"),
    loadBasis: from("loadBasis", "characteristic-full"),
    groundwaterLevel_m: from("groundwaterLevel_m", null),
    minBreadth_m: from("minBreadth_m", null),
    maxBreadth_m: from("maxBreadth_m", null),
    minFoundingDepth_m: from("minFoundingDepth_m", null),
    highestFoundingLevel_m: from("highestFoundingLevel_m", null),
    lowestFoundingLevel_m: from("lowestFoundingLevel_m", null),
    transientFactor: from("transientFactor", 1),
    accidentalFactor: from("accidentalFactor", 1),
    // Remarks of a check, not its verdict.
    basis: "recommended",
    purpose: "preliminary",
    confirmBy: null,
    confirmWho: null,
  };
}

/** What the required value of a footing depends on, as one text: all terms but the pressure and the stated ranges. */
const demandOf = (terms: JudgedTerms): string =>
  JSON.stringify([
    terms.loadBasis,
    terms.comparedWith,
    terms.soilUnitWeight_kNm3,
    terms.groundwaterLevel_m,
    terms.transientFactor,
    terms.accidentalFactor,
  ]);

/** True when a linked footing's last check stands on another revision, other size, loads or criteria than count today. */
async function standElsewhere(
  tx: Transaction,
  context: Context,
  valueId: ValueId,
  currentRevisionId: ValueRevisionId | null,
): Promise<boolean> {
  const { rows } = await tx.execute<{ elsewhere: boolean }>(sql`
    select exists (
      select from footing f
      join project p on p.id = f.project_id
      join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
      where f.project_id = ${context.projectId} and f.value_id = ${valueId}
        and (c.value_revision_id is distinct from ${currentRevisionId}::uuid
          or c.footing_revision_id is distinct from f.current_revision_id
          or c.load_set_id is distinct from f.current_load_set_id
          or c.criteria_number <> p.current_criteria)) as elsewhere`);
  return rows[0]?.elsewhere ?? false;
}
