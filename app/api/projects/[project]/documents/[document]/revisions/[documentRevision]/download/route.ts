import { read } from "@/lib/http/handle";
import { downloadDocument } from "@/lib/services/documents/download";

/** A short-lived link to the stored file. */
export const GET = read({ run: downloadDocument });
