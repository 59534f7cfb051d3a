import { eventStream } from "@/lib/http/event-stream";
import { read } from "@/lib/http/handle";

/** Tells of the project's changes while the page is open. */
export const GET = read({ run: eventStream });
