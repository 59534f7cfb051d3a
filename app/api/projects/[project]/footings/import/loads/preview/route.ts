import { previewLoadImportInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { previewLoadImport } from "@/lib/services/loads/import-loads";

/** Shows what a file of load combinations would do to the footings that it names; writes nothing. */
export const POST = write({ body: previewLoadImportInput, limit_bytes: 17_000_000, run: previewLoadImport });
