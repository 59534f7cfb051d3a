import { previewFootingImportInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { previewFootingImport } from "@/lib/services/footings/import-footings";

/** Shows what a file of footings would do to the register; writes nothing. */
export const POST = write({
  body: previewFootingImportInput,
  limit_bytes: 17_000_000,
  run: previewFootingImport,
});
