import { sql } from "drizzle-orm";
import { client } from "@/db/client";
import { Throttled } from "../errors";

/**
 * How guessing is slowed down, and the rightful person is not shut out:
 *
 * - Failures of the last hour count. After a number of free ones each further try has to wait for twice as long as the
 *   one before, one second at first and one minute at most. Nothing is ever locked; a try that comes too early is
 *   refused unread and counts for nothing.
 * - A place that this account has signed in from within 30 days has a count of its own (5 free). So others' guessing,
 *   from anywhere, never slows the account's owner at the usual place.
 * - All other places share one count for the account (10 free), and one for each address over all accounts (20 free).
 * - Who is at a new place while somebody else keeps guessing asks for a reset link: that way is always open, and using
 *   the link makes the place a known one.
 *
 * The try is counted as failed before the password is looked at, and uncounted when it was right, so that many tries at
 * once are worth no more than one after the other.
 */
const KNOWN_PLACE_DAYS = 30;
const FREE = { knownPlace: 5, account: 10, address: 20 };
const LONGEST_WAIT_S = 60;

/** Seconds to wait after so many failures: none while they are free, then 1, 2, 4 … up to a minute. */
export const wait_s = (failures: number, free: number): number =>
  failures < free ? 0 : Math.min(2 ** (failures - free), LONGEST_WAIT_S);

export type Attempt = { seq: number; account: string; address: string };

type Counted = {
  known: boolean;
  pair: number;
  pair_age: number | null;
  account: number;
  account_age: number | null;
  address: number;
  address_age: number | null;
};

/** Counts a try as failed, or refuses it when it comes too early. Release it when the password was right. */
export async function beginAttempt(account: string, address: string): Promise<Attempt> {
  return client().database.transaction(async (tx) => {
    // Always in this order, so that two tries never wait for each other.
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`sign-in account ${account}`}, 0))`);
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`sign-in address ${address}`}, 0))`);
    const { rows } = await tx.execute<Counted>(sql`
      with recent as (
        select *, extract(epoch from clock_timestamp() - at)::float8 as age from sign_in_attempt
        where (account = ${account} or address = ${address}) and at > clock_timestamp() - make_interval(days => ${KNOWN_PLACE_DAYS})
      ), home as (
        select address from recent where account = ${account} and succeeded
      ), failed as (
        select * from recent where not succeeded and age < 3600
      ), last_good as (
        select max(at) as at from recent where account = ${account} and address = ${address} and succeeded
      )
      select exists (select from home where address = ${address}) as known,
        count(*) filter (where pair)::int as pair, min(age) filter (where pair) as pair_age,
        count(*) filter (where elsewhere)::int as account, min(age) filter (where elsewhere) as account_age,
        count(*) filter (where here)::int as address, min(age) filter (where here) as address_age
      from (
        select age,
          account = ${account} and address = ${address}
            and at > coalesce((select at from last_good), '-infinity') as pair,
          account = ${account} and address not in (select address from home) as elsewhere,
          address = ${address} as here
        from failed
      ) f`);
    const counted = rows[0];
    if (!counted) throw new Error("A count of nothing is still a row.");
    const left = (failures: number, free: number, age_s: number | null) =>
      wait_s(failures, free) - (age_s ?? 0);
    const remaining_s = counted.known
      ? left(counted.pair, FREE.knownPlace, counted.pair_age)
      : Math.max(
          left(counted.account, FREE.account, counted.account_age),
          left(counted.address, FREE.address, counted.address_age),
        );
    if (remaining_s > 0) {
      const seconds = Math.ceil(remaining_s);
      throw new Throttled(
        `Too many attempts. Please wait ${seconds} ${seconds === 1 ? "second" : "seconds"} and try again, or ask for a link to set a new password.`,
        seconds,
      );
    }
    const written = await tx.execute<{ seq: string }>(sql`
      insert into sign_in_attempt (account, address, succeeded) values (${account}, ${address}, false) returning seq`);
    return { seq: Number(written.rows[0]?.seq), account, address };
  });
}

/** Turns a try into a success: the place is a known one from now on. Forgets what is older than the rule looks back. */
export async function attemptSucceeded(attempt: Attempt): Promise<void> {
  await client().database.transaction(async (tx) => {
    await tx.execute(sql`delete from sign_in_attempt where seq = ${attempt.seq}
      or ((account = ${attempt.account} or address = ${attempt.address})
        and at < now() - make_interval(days => ${KNOWN_PLACE_DAYS + 1}))`);
    await tx.execute(sql`insert into sign_in_attempt (account, address, succeeded)
      values (${attempt.account}, ${attempt.address}, true)`);
  });
}
