import { closeChangeInput } from "@/lib/contracts/changes";
import { write } from "@/lib/http/handle";
import { closeChange } from "@/lib/services/changes/close-change";

/** The project lead closes an answered change. */
export const POST = write({ body: closeChangeInput, status: 201, run: closeChange });
