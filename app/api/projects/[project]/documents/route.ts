import { read } from "@/lib/http/handle";
import { listDocuments } from "@/lib/services/documents/list-documents";

/** The project's documents, each with the revision that counts. */
export const GET = read({ run: listDocuments });
