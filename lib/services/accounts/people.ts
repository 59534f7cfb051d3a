import { sql } from "drizzle-orm";
import { client } from "@/db/client";
import { findPeopleInput, openAccountInput, type PersonRow } from "@/lib/contracts/accounts";
import type { PersonId } from "@/lib/contracts/ids";
import { throughDoor } from "../context";
import { Conflict, NotFound } from "../errors";
import { isoMoment } from "../iso-moment";
import { parse } from "../parse";
import { endEverySession } from "./end-sessions";
import { siteEvent } from "./site-event";
import { siteAdministrator, type Visitor } from "./visitor";

/** People with accounts, by name or address, for the site administrator; the first 200. */
export async function findPeople(visitor: Visitor, given: unknown): Promise<{ people: PersonRow[] }> {
  siteAdministrator(visitor);
  const { search } = parse(findPeopleInput, given);
  const pattern = `%${search.replace(/[\\%_]/g, "\\$&")}%`;
  const { rows } = await client().database.execute<PersonRow>(sql`
    select id, name, email, site_administrator as "siteAdministrator", ${isoMoment(sql`disabled_at`)} as "disabledAt"
    from person where name ilike ${pattern} or email ilike ${pattern} order by name, id limit 200`);
  return { people: rows };
}

/** Opens or shuts an account. Shutting ends every session and open link; what the person did stays as it is. */
export async function setAccountOpen(
  visitor: Visitor,
  given: unknown,
): Promise<{ id: string; open: boolean }> {
  const administrator = siteAdministrator(visitor);
  const { personId, open } = parse(openAccountInput, given);
  if (personId === administrator.id) throw new Conflict("You cannot shut your own account.");
  await throughDoor("accounts", async (tx) => {
    const changed = await tx.execute<{ email: string }>(sql`
      update person set disabled_at = ${open ? sql`null` : sql`coalesce(disabled_at, now())`}
      where id = ${personId} returning email`);
    const [person] = changed.rows;
    if (!person) throw new NotFound("There is no such person.");
    if (!open) {
      await endEverySession(tx, personId as PersonId);
      await tx.execute(sql`
        update one_time_link set used_at = now() where email = ${person.email} and used_at is null`);
    }
    await siteEvent(tx, visitor, {
      verb: open ? "account:open" : "account:shut",
      personId: administrator.id,
      detail: { subject: personId },
    });
  });
  return { id: personId, open };
}
