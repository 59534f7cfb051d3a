import { assertMay, type Context } from "@/lib/services/context";
import { Throttled } from "@/lib/services/errors";
import { rolesInProject } from "@/lib/services/members/roles-in-project";
import { type Heard, liveChanges } from "@/lib/services/projects/live-changes";
import { sessionWatch } from "./session";

/** Access is looked at again this often; within it a stream of somebody who lost it ends. */
const LOOK_AGAIN_MS = 4000;
const STREAMS_A_PERSON = 20;

const open = new Map<string, number>();

/** Tells an open browser of the project's changes as they are committed (server-sent events), while its access lasts. */
export async function eventStream(context: Context): Promise<Response> {
  assertMay(context, "project:read");
  const { projectId, person } = context;
  const count = open.get(person.id) ?? 0;
  if (count >= STREAMS_A_PERSON)
    throw new Throttled("Too many windows listen for changes. Please close some.", 60);
  open.set(person.id, count + 1);
  const stillSignedIn = await sessionWatch();
  const encoder = new TextEncoder();
  let end = () => {};
  const body = new ReadableStream<Uint8Array>({
    start(out) {
      const send = (text: string) => out.enqueue(encoder.encode(text));
      const tell = (heard: Heard) =>
        send(
          "changeId" in heard
            ? `event: change\ndata: ${JSON.stringify(heard)}\n\n`
            : "event: reread\ndata: {}\n\n",
        );
      const stop = liveChanges().listen(projectId, tell);
      const timer = setInterval(async () => {
        // When the database does not answer nobody can say that access lasts: the stream ends and the browser asks again.
        const allowed = await stillSignedIn()
          .then(async (signedIn) => signedIn && (await rolesInProject(person.id, projectId)).length > 0)
          .catch(() => false);
        if (ended) return;
        if (allowed) send(": still here\n\n");
        else {
          end();
          out.close();
        }
      }, LOOK_AGAIN_MS);
      let ended = false;
      end = () => {
        if (ended) return;
        ended = true;
        clearInterval(timer);
        stop();
        const left = (open.get(person.id) ?? 1) - 1;
        if (left > 0) open.set(person.id, left);
        else open.delete(person.id);
      };
      send("retry: 2000\n\n");
    },
    cancel: () => end(),
  });
  return new Response(body, { headers: { "content-type": "text/event-stream", "x-accel-buffering": "no" } });
}
