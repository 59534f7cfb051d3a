import { beginUploadInput } from "@/lib/contracts/documents";
import { write } from "@/lib/http/handle";
import { beginUpload } from "@/lib/services/documents/begin-upload";

/** Hands out a presigned request for one file. */
export const POST = write({ body: beginUploadInput, status: 201, run: beginUpload });
