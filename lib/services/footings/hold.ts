import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingId } from "@/lib/contracts/ids";
import type { Context } from "../context";

type Seen = {
  verdict: string | null;
  standing: string | null;
  reasons: string[] | null;
  basis: string | null;
  purpose: string | null;
  confirmBy: string | null;
  confirmWho: string | null;
  reference: string | null;
};

/** Why a footing may not go on to a stage, each as a sentence; null where nothing holds it. */
export type Holds = {
  /** Before the formation is accepted or concrete is poured. */
  concrete: string | null;
  /** Before it is issued for construction. */
  issue: string | null;
};

/** Reads, with what counts now, what holds a footing back. */
export async function holdsOf(tx: Transaction, context: Context, footingId: FootingId): Promise<Holds> {
  const { rows } = await tx.execute<Seen>(sql`
    select k.verdict, s.standing, s.reasons, r.basis, r.purpose, r.confirm_by as "confirmBy",
      r.confirm_who as "confirmWho", v.reference
    from footing f
    left join footing_check k on k.project_id = f.project_id and k.id = f.latest_check_id
    left join check_standing s on s.project_id = f.project_id and s.check_id = f.latest_check_id
    left join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
    left join bearing_value_revision r on r.project_id = v.project_id and r.id = v.current_revision_id
    where f.project_id = ${context.projectId} and f.id = ${footingId}`);
  const [seen] = rows;
  if (!seen) return { concrete: null, issue: null };
  return { concrete: notStanding(seen), issue: unconfirmed(seen) };
}

function notStanding(seen: Seen): string | null {
  if (seen.verdict === null) return "Stop: the footing has no check. Check it first.";
  if (seen.standing !== "current")
    return `Stop: the check is affected (${(seen.reasons ?? []).join("; ")}). The footing is not approved until it is re-checked.`;
  if (seen.verdict === "fails")
    return "Stop: the last check fails. Resize the footing or refer it back first.";
  if (seen.verdict !== "passes") return "Stop: the footing lies outside the conditions of its bearing value.";
  return null;
}

function unconfirmed(seen: Seen): string | null {
  if (seen.basis === "assumed" || seen.basis === "presumptive") {
    const who = [
      seen.confirmWho && ` by ${seen.confirmWho}`,
      seen.confirmBy && ` until ${seen.confirmBy}`,
    ].filter(Boolean);
    return `Stop: ${seen.reference} is ${seen.basis} and is to be confirmed${who.join("")} before anything is issued for construction.`;
  }
  if (seen.purpose === "preliminary")
    return `Stop: ${seen.reference} is preliminary. It is for design before anything is issued for construction.`;
  return null;
}
