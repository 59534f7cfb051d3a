import { and, desc, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import type { DraftContent } from "@/lib/contracts/values";
import { readValueInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict } from "../errors";
import { parse } from "../parse";
import { type DraftKept, lockValueAndDraft } from "./draft-row";

/**
 * Begins the next revision of a value: empty for a first one, else as the last revision stood, with its reason left
 * to be given anew.
 */
export async function startDraft(context: Context, given: { valueId: string }) {
  assertMay(context, "value:draft");
  const { valueId } = parse(readValueInput, given);

  return inProject(context, async (tx) => {
    const { draft } = await lockValueAndDraft(tx, context, valueId);
    if (draft) throw new Conflict("A draft of this value is being written already. Go on with that one.");
    const of = and(
      eq(t.bearingValueRevision.projectId, context.projectId),
      eq(t.bearingValueRevision.valueId, valueId),
    );
    const [last] = await tx
      .select()
      .from(t.bearingValueRevision)
      .where(of)
      .orderBy(desc(t.bearingValueRevision.number))
      .limit(1);
    const sources = last
      ? await tx
          .select()
          .from(t.valueSource)
          .where(
            and(eq(t.valueSource.projectId, context.projectId), eq(t.valueSource.valueRevisionId, last.id)),
          )
          .orderBy(t.valueSource.ordinal)
      : [];
    const kept: DraftKept = { fields: last ? contentOf(last, sources) : {}, editors: [context.person.id] };
    await tx
      .insert(t.bearingValueDraft)
      .values({ projectId: context.projectId, valueId, content: kept, preparedBy: context.person.id });
    await audit(tx, context, {
      verb: "value:draft",
      subject: `value/${valueId}`,
      detail: { started: true, from: last?.code ?? null },
    });
    return { valueId, revision: 1, content: kept.fields };
  });
}

function contentOf(
  last: typeof t.bearingValueRevision.$inferSelect,
  sources: (typeof t.valueSource.$inferSelect)[],
): DraftContent {
  return {
    given: last.given,
    givenBasis: last.givenBasis,
    givenOverburden_kPa: last.givenOverburden_kPa,
    factorConvention: last.factorConvention,
    factorOfSafety: last.factorOfSafety,
    comparedWith: last.comparedWith,
    loadBasis: last.loadBasis,
    governedBy: last.governedBy,
    settlementLimit_mm: last.settlementLimit_mm,
    settlementPredicted_mm: last.settlementPredicted_mm,
    minBreadth_m: last.minBreadth_m,
    maxBreadth_m: last.maxBreadth_m,
    minFoundingDepth_m: last.minFoundingDepth_m,
    highestFoundingLevel_m: last.highestFoundingLevel_m,
    lowestFoundingLevel_m: last.lowestFoundingLevel_m,
    groundwaterLevel_m: last.groundwaterLevel_m,
    groundwaterBasis: last.groundwaterBasis,
    soilUnitWeight_kNm3: last.soilUnitWeight_kNm3,
    drainage: last.drainage,
    transientIncrease: last.transientIncrease,
    transientFactor: last.transientFactor,
    accidentalFactor: last.accidentalFactor,
    neighbours: last.neighbours,
    conditions: last.conditions,
    basis: last.basis,
    confirmBy: last.confirmBy,
    confirmWho: last.confirmWho,
    purpose: last.purpose,
    sources: sources.map(({ documentRevisionId, page, clause, note, holes }) => ({
      documentRevisionId,
      page,
      clause,
      note,
      holes,
    })),
  };
}
