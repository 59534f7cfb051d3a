import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Role } from "@/lib/access/policy";
import type { Context } from "../context";
import { Conflict, NotFound } from "../errors";

/** Lets one change of a project's members happen at a time, until this transaction ends. */
export async function lockMembership(tx: Transaction, context: Context): Promise<void> {
  await tx.execute(sql`select 1 from project where id = ${context.projectId} for update`);
}

/** A member's name and roles now; refuses one who is none. */
export async function memberNow(
  tx: Transaction,
  context: Context,
  personId: string,
): Promise<{ name: string; email: string; roles: Role[] }> {
  const { rows } = await tx.execute<{ name: string; email: string; roles: Role[] }>(sql`
    select p.name, p.email, array_agg(m.role order by m.role) as roles
    from membership m join person p on p.id = m.person_id
    where m.project_id = ${context.projectId} and m.person_id = ${personId} group by p.id`);
  if (!rows[0]) throw new NotFound("There is no such member in this project.");
  return rows[0];
}

/** Refuses what would leave the project without an open account that leads it. */
export async function assertLeadRemains(tx: Transaction, context: Context): Promise<void> {
  const { rowCount } = await tx.execute(sql`
    select 1 from membership m join person p on p.id = m.person_id
    where m.project_id = ${context.projectId} and m.role = 'lead' and p.disabled_at is null limit 1`);
  if (rowCount === 0)
    throw new Conflict("A project keeps at least one project lead. Make somebody else project lead first.");
}
