import { changeDocumentInput } from "@/lib/contracts/documents";
import { read, write } from "@/lib/http/handle";
import { changeDocument } from "@/lib/services/documents/change-document";
import { readDocument } from "@/lib/services/documents/read-document";

/** One document with its revisions and what cites them. */
export const GET = read({ run: readDocument });

/** Corrects title, kind or author. */
export const PATCH = write({ body: changeDocumentInput, ifMatch: true, run: changeDocument });
