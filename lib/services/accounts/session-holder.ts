import { sql } from "drizzle-orm";
import { client } from "@/db/client";
import type { PersonId } from "@/lib/contracts/ids";

export type SignedIn = { id: PersonId; name: string; email: string; siteAdministrator: boolean };

/** A session ends after so long without a request, and in any case so long after sign-in. */
export const IDLE_SECONDS = 8 * 3600;
export const ABSOLUTE_SECONDS = 24 * 3600;

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/**
 * The person of a session, if the account is open, the session has not ended and neither limit of time has passed; else
 * null. Read at every request. `use` marks the session as used, to the minute; an open stream does not count as use.
 */
export async function sessionHolder(
  session: { personId: string; sessionVersion: number; sessionId: string },
  use = true,
): Promise<SignedIn | null> {
  if (!UUID.test(session.personId) || !UUID.test(session.sessionId)) return null;
  const { rows } = await client().database.execute<SignedIn & { unmarked: boolean }>(sql`
    select p.id, p.name, p.email, p.site_administrator as "siteAdministrator",
      s.seen_at < now() - interval '1 minute' as unmarked
    from person_session s join person p on p.id = s.person_id
    where s.id = ${session.sessionId} and p.id = ${session.personId} and p.session_version = ${session.sessionVersion}
      and p.disabled_at is null and s.ended_at is null
      and s.started_at > now() - make_interval(secs => ${ABSOLUTE_SECONDS})
      and s.seen_at > now() - make_interval(secs => ${IDLE_SECONDS})`);
  const [found] = rows;
  if (!found) return null;
  const { unmarked, ...person } = found;
  if (use && unmarked)
    await client().database.execute(
      sql`update person_session set seen_at = now() where id = ${session.sessionId} and ended_at is null`,
    );
  return person;
}
