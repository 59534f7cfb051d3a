import { write } from "@/lib/http/handle";
import { cancelUpload } from "@/lib/services/documents/cancel-upload";

/** Gives up a waiting upload. */
export const POST = write({ run: cancelUpload });
