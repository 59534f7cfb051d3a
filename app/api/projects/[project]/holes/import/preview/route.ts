import { previewGroundInput } from "@/lib/contracts/ground";
import { write } from "@/lib/http/handle";
import { previewGround } from "@/lib/services/holes/preview-ground";

/** Says what an uploaded AGS file would do. Writes nothing. */
export const POST = write({ body: previewGroundInput, run: previewGround });
