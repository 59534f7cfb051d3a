import { type ConfirmLinksInput, confirmLinksInput } from "@/lib/contracts/footings";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, Invalid } from "../errors";
import { parse } from "../parse";
import { gatherPlaces, gatherZones } from "./gather-places";
import { type Link, lockFootings, storeLinks } from "./store-links";
import { suggestLink } from "./suggest";

/** How many refused marks a sentence names. */
const NAMED = 20;

/** Links footings to the values proposed from their zones. Each proposal is made again: one that has moved is refused. */
export async function confirmLinks(context: Context, given: ConfirmLinksInput) {
  assertMay(context, "footing:link");
  const { links } = parse(confirmLinksInput, given);
  const wanted = new Map(links.map(({ footingId, valueId }) => [footingId, valueId]));
  if (wanted.size < links.length)
    throw new Invalid("A footing is named twice.", { links: "A footing is named twice." });

  return inProject(context, async (tx) => {
    await lockFootings(tx, context, [...wanted.keys()]);
    const footings = await gatherPlaces(tx, context, [...wanted.keys()]);
    const zones = await gatherZones(tx, context);
    const stored: Link[] = [];
    const moved: string[] = [];
    for (const footing of footings) {
      const { valueId, sentence } = suggestLink(footing, zones);
      if (valueId === null || valueId !== wanted.get(footing.id)) moved.push(footing.mark);
      else if (valueId !== footing.valueId)
        stored.push({ footingId: footing.id, valueId, how: "from-zone", reason: sentence });
    }
    if (moved.length > 0)
      throw new Conflict(
        `The zones propose another value now for ${moved.slice(0, NAMED).join(", ")}${moved.length > NAMED ? ` and ${moved.length - NAMED} more` : ""}. Look at the proposals again.`,
        { marks: moved },
      );
    await storeLinks(tx, context, stored);
    await audit(tx, context, {
      verb: "footing:link",
      subject: `project/${context.projectId}`,
      detail: { how: "from-zone", links: stored.map(({ footingId, valueId }) => ({ footingId, valueId })) },
    });
    return { linked: stored.length, unchanged: footings.length - stored.length };
  });
}
