import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { type AuditPage, type AuditRow, readAuditInput } from "@/lib/contracts/projects";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";

/** A page of the audit trail from the newest back, searched in who, what, subject and detail. */
export async function readAudit(context: Context, given: unknown): Promise<AuditPage> {
  assertMay(context, "audit:read");
  const { search, before, limit } = parse(readAuditInput, given);
  return inProject(context, (tx) => page(tx, context, { search, before, limit }));
}

async function page(
  tx: Transaction,
  context: Context,
  { search, before, limit }: { search: string; before?: number; limit: number },
): Promise<AuditPage> {
  const pattern = `%${search.trim().replace(/[\\%_]/g, "\\$&")}%`;
  const { rows } = await tx.execute<Omit<AuditRow, "detail" | "seq"> & { detail: string; seq: string }>(sql`
    select e.seq, to_char(e.at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"') as at,
      coalesce(p.name, 'unknown person') as actor, e.roles, e.verb, e.subject, e.detail, e.request_id as "requestId",
      e.hash
    from audit_event e left join person p on p.id = e.actor_id
    where e.project_id = ${context.projectId} ${before === undefined ? sql`` : sql`and e.seq < ${before}`}
      ${search.trim() === "" ? sql`` : sql`and (e.verb ilike ${pattern} or e.subject ilike ${pattern} or e.detail ilike ${pattern} or p.name ilike ${pattern})`}
    order by e.seq desc limit ${limit + 1}`);
  const events = rows
    .slice(0, limit)
    .map((row) => ({ ...row, seq: Number(row.seq), detail: JSON.parse(row.detail) }));
  return { events, next: rows.length > limit ? (events.at(-1)?.seq ?? null) : null };
}

const EXPORT_PAGE = 1000;

/** The whole audit trail as CSV, newest first, a page at a time so that its length costs no memory. */
export async function exportAudit(context: Context): Promise<Response> {
  assertMay(context, "audit:read");
  let before: number | undefined;
  let done = false;
  const next = () =>
    inProject(context, (tx) => page(tx, context, { search: "", before, limit: EXPORT_PAGE }));
  const encoder = new TextEncoder();
  const body = new ReadableStream<Uint8Array>({
    start: (out) => out.enqueue(encoder.encode("seq,at,actor,roles,verb,subject,detail,request,hash\r\n")),
    async pull(out) {
      if (done) return out.close();
      const read = await next();
      const lines = read.events.map((event) =>
        [
          event.seq,
          event.at,
          event.actor,
          event.roles,
          event.verb,
          event.subject,
          JSON.stringify(event.detail),
          event.requestId,
          event.hash,
        ]
          .map(cell)
          .join(","),
      );
      if (lines.length > 0) out.enqueue(encoder.encode(`${lines.join("\r\n")}\r\n`));
      before = read.next ?? undefined;
      done = read.next === null;
      if (done && lines.length === 0) out.close();
    },
  });
  return new Response(body, {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": 'attachment; filename="audit-trail.csv"',
      "x-content-type-options": "nosniff",
    },
  });
}

/** One CSV cell. A cell that a spreadsheet would run as a formula gets an apostrophe before it. */
function cell(content: string | number): string {
  const text = String(content);
  const inert = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(inert) ? `"${inert.replaceAll('"', '""')}"` : inert;
}
