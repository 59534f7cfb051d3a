import { type SQL, sql } from "drizzle-orm";
import type { RevisionPreview } from "@/lib/contracts/changes";
import type { FootingId } from "@/lib/contracts/ids";
import { gatherLinked } from "../changes/gather-linked";
import type { JudgedTerms } from "../changes/judge";
import { noCounts } from "../changes/outcome";
import { CURVE_POINTS, NAMED, type PreviewAt, runTrial, type Seen, worstFirst } from "./preview-by-running";

type Row = {
  linked: number;
  unchecked: number;
  outside: number;
  fails: number;
  holds: number;
  excavated: number;
  poured: number;
  rest: number;
  first: RevisionPreview["firstToFail"];
  curve: RevisionPreview["curve"] | null;
  troubled: (Omit<Seen, "outcome"> & { outside: boolean })[] | null;
};

/**
 * The preview from the required value stored with each last check, in one statement. A footing that passed passes in all
 * but bearing whatever the pressure; those that did not pass, few as a rule, are run again, because something else than
 * bearing may hold them back. Without terms to try only the curve is told.
 */
export async function previewFromRequired(
  at: PreviewAt,
  trial: JudgedTerms | null,
): Promise<RevisionPreview> {
  const { tx, context, valueId, currentNet_kPa } = at;
  const net_kPa = trial?.netAllowable_kPa ?? null;
  const outside = trial ? outsideOf(trial) : sql`false`;
  const { rows } = await tx.execute<Row>(sql`
    with linked as materialized (
      select f.id, f.mark, f.stage, c.verdict, c.required_net_kpa as required, ${outside} as outside,
        c.required_net_kpa > ${net_kPa}::float8 as fails
      from footing f
      left join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
      left join footing_revision g on g.project_id = f.project_id and g.id = f.current_revision_id
      where f.project_id = ${context.projectId} and f.value_id = ${valueId}),
    ranked as (
      select required, (rank() over (order by required desc))::int - 1 as failing,
        row_number() over (order by required desc) as place, count(*) over () as number
      from linked where required is not null),
    troubled as (select * from linked where verdict = 'passes' and (outside or fails))
    select count(*)::int as linked, (count(*) filter (where verdict is null))::int as unchecked,
      (count(*) filter (where verdict = 'passes' and outside))::int as outside,
      (count(*) filter (where verdict = 'passes' and not outside and fails))::int as fails,
      (count(*) filter (where verdict = 'passes' and not outside and not fails))::int as holds,
      (count(*) filter (where verdict <> 'passes'))::int as rest,
      (select count(*)::int from troubled where stage in ('excavated', 'formation-accepted')) as excavated,
      (select count(*)::int from troubled where stage = 'poured') as poured,
      (select json_build_object('footingId', id, 'mark', mark, 'requiredNet_kPa', required) from linked
        where required > 0 and required <= coalesce(${currentNet_kPa}::float8, 'Infinity')
        order by required desc, mark limit 1) as first,
      (select json_agg(json_build_object('netAllowable_kPa', required, 'failing', failing) order by place) from ranked
        where (place - 1) % greatest(1, ceil(number / ${CURVE_POINTS}::float8)::int) = 0 or place = number) as curve,
      (select json_agg(t) from (
        select id as "footingId", mark, stage, required as "requiredNet_kPa", outside from troubled
        order by required desc nulls last, mark limit ${NAMED}) t) as troubled
    from linked`);
  const row = rows[0];
  if (!row) throw new Error("A count gave no row.");
  const counts = { ...noCounts() };
  const troubled: Seen[] = (row.troubled ?? []).map(({ outside: out, ...seen }) => ({
    ...seen,
    outcome: out ? "outside conditions" : "now fails",
  }));
  let { excavated, poured } = row;
  if (trial) {
    Object.assign(counts, { "outside conditions": row.outside, "now fails": row.fails, holds: row.holds });
    if (row.rest > 0) {
      const notPassing = sql`f.value_id = ${valueId} and k.verdict <> 'passes'`;
      const rest = await runTrial(gatherLinked(tx, context, notPassing), trial);
      for (const outcome of Object.keys(counts) as (keyof typeof counts)[])
        counts[outcome] += rest.counts[outcome];
      troubled.push(...rest.troubled);
      excavated += rest.excavated;
      poured += rest.poured;
    }
  }
  return {
    netAllowable_kPa: net_kPa,
    currentNet_kPa,
    how: "stored required values",
    linked: row.linked,
    unchecked: row.unchecked,
    counts,
    excavatedAffected: excavated,
    pouredAffected: poured,
    firstToFail: row.first ? { ...row.first, footingId: row.first.footingId as FootingId } : null,
    curve: row.curve ?? [],
    worst: worstFirst(troubled, net_kPa),
  };
}

/** True where a footing `g` lies outside the ranges that the terms state. */
function outsideOf(trial: JudgedTerms): SQL {
  const conditions: SQL[] = [sql`false`];
  if (trial.minBreadth_m !== null)
    conditions.push(sql`least(g.breadth_m, g.length_m) < ${trial.minBreadth_m}::float8`);
  if (trial.maxBreadth_m !== null)
    conditions.push(sql`least(g.breadth_m, g.length_m) > ${trial.maxBreadth_m}::float8`);
  if (trial.minFoundingDepth_m !== null)
    conditions.push(
      // A depth is a difference of two levels: the check forgives it the last digits, and so does this.
      sql`g.ground_level_m - g.founding_level_m < ${trial.minFoundingDepth_m}::float8 - 1e-9`,
    );
  if (trial.highestFoundingLevel_m !== null)
    conditions.push(sql`g.founding_level_m > ${trial.highestFoundingLevel_m}::float8`);
  if (trial.lowestFoundingLevel_m !== null)
    conditions.push(sql`g.founding_level_m < ${trial.lowestFoundingLevel_m}::float8`);
  return sql`(${sql.join(conditions, sql` or `)})`;
}
