import { finishUploadInput } from "@/lib/contracts/documents";
import { write } from "@/lib/http/handle";
import { finishUpload } from "@/lib/services/documents/finish-upload";

/** Verifies the file that has arrived and records it as a document revision. */
export const POST = write({ body: finishUploadInput, status: 201, run: finishUpload });
