import pg from "pg";
import { beforeAll, describe, expect, it } from "vitest";
import type { ValueId } from "@/lib/contracts/ids";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { previewRevision } from "@/lib/services/revisions/preview-revision";
import { withdrawRevision } from "@/lib/services/revisions/withdraw-revision";
import { discardDraft } from "@/lib/services/values/discard-draft";
import { saveDraft } from "@/lib/services/values/save-draft";
import { startDraft } from "@/lib/services/values/start-draft";
import { freshDatabase } from "@/tests/support/database";
import { addPads, checkPads } from "../values/footings-in-bulk";
import {
  buildWorld,
  checkedRevision,
  completeDraft,
  issuedRevision,
  openValue,
  type World,
} from "../values/register-world";

const NUMBER = 10_000;
let here: World;
let valueId: ValueId;

/** Every statement that reaches the server while something is done, transaction control and settings included. */
async function statementsOf(act: () => Promise<unknown>): Promise<number> {
  const real = pg.Client.prototype.query;
  let statements = 0;
  pg.Client.prototype.query = function counted(this: pg.Client, ...given: Parameters<typeof real>) {
    statements += 1;
    return real.apply(this, given);
  } as typeof real;
  try {
    await act();
  } finally {
    pg.Client.prototype.query = real;
  }
  return statements;
}

beforeAll(async () => {
  await freshDatabase();
  here = await buildWorld("BIG-1");
  valueId = await openValue(here);
  await issuedRevision(here, valueId);
  // Required values from 3 to 303 kPa: some hold at 250 kPa, some at 200, some at neither.
  const pads = Array.from({ length: NUMBER }, (_, at) => ({ vertical_kN: (1200 * at) / NUMBER }));
  await checkPads(here, await addPads(here, valueId, pads, 8));
});

describe("ten thousand linked footings of eight combinations", () => {
  it("are previewed in at most thirty statements, from stored required values or by running them again", async () => {
    const { revision } = await startDraft(here.preparer, { valueId });
    const content = completeDraft(here, {
      given: "200 kPa",
      reasonCode: "water",
      reason: "Groundwater is higher",
    });
    const saved = await saveDraft(here.preparer, { valueId, revision, content });
    expect(await statementsOf(() => previewRevision(here.preparer, { valueId }))).toBeLessThanOrEqual(30);
    await saveDraft(here.preparer, {
      valueId,
      revision: saved.revision,
      content: { ...content, soilUnitWeight_kNm3: 19 },
    });
    expect(await statementsOf(() => previewRevision(here.preparer, { valueId }))).toBeLessThanOrEqual(30);
    await discardDraft(here.preparer, { valueId, revision: saved.revision + 1 });
  });

  it("get their consequence each when a revision is issued and withdrawn, in at most thirty statements each", async () => {
    const checked = await checkedRevision(here, valueId, {
      given: "200 kPa",
      reasonCode: "water",
      reason: "Groundwater is higher",
    });
    let counts: Record<string, number> = {};
    const statements = await statementsOf(async () => {
      ({ counts } = await issueRevision(here.issuer, {
        valueId,
        revisionId: checked.revisionId,
        revision: checked.revision,
      }));
    });
    expect(statements).toBeLessThanOrEqual(30);
    // N/4 + 3 > 250 kPa from N = 988 kN; > 200 kPa from N = 788 kN; N goes up by 0.12 kN a pad.
    const above = (limit_kN: number) =>
      Array.from({ length: NUMBER }, (_, at) => (1200 * at) / NUMBER).filter((n) => n > limit_kN).length;
    expect(counts).toEqual({
      "still fails": above(988),
      "now fails": above(788) - above(988),
      holds: NUMBER - above(788),
      recovers: 0,
      "outside conditions": 0,
    });

    const issued = checked.revision + 1;
    const withdrawing = await statementsOf(() =>
      withdrawRevision(here.lead, {
        valueId,
        revisionId: checked.revisionId,
        revision: issued,
        reason: "The report has been called back by its author",
      }),
    );
    expect(withdrawing).toBeLessThanOrEqual(30);
  });
});
