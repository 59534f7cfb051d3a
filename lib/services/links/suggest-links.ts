import { type LinkSuggestion, type SuggestLinksInput, suggestLinksInput } from "@/lib/contracts/footings";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";
import { gatherPlaces, gatherZones } from "./gather-places";
import { suggestLink } from "./suggest";

/** Proposes a value for each of the footings, from the zones that they lie in. Nothing is written. */
export async function suggestLinks(
  context: Context,
  given: SuggestLinksInput,
): Promise<{ suggestions: LinkSuggestion[] }> {
  assertMay(context, "project:read");
  const { footingIds } = parse(suggestLinksInput, given);
  return inProject(context, async (tx) => {
    const footings = await gatherPlaces(tx, context, footingIds);
    const zones = await gatherZones(tx, context);
    return { suggestions: footings.map((footing) => suggestLink(footing, zones)) };
  });
}
