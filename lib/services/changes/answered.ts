import { sql } from "drizzle-orm";

/**
 * The last answer to consequence `q` (as `a`, with the verdict of its check), and whether it settles it. A re-check
 * that still fails is recorded but settles nothing; a poured footing that no longer stands on its value is settled only by
 * acceptance or by going back to the geotechnical engineer.
 */
export const lastAnswer = sql`
  left join lateral (
    select d.kind, d.reason, d.answered_by, d.answered_at, k.verdict from disposition d
    left join footing_check k on k.project_id = d.project_id and k.id = d.check_id
    where d.project_id = q.project_id and d.consequence_id = q.id order by d.number desc limit 1
  ) a on true`;

export const isAnswered = sql`coalesce(a.kind in ('accepted-as-built', 'referred-back') or (a.verdict = 'passes'
  and (q.stage <> 'poured' or q.outcome in ('holds', 'recovers'))), false)`;
