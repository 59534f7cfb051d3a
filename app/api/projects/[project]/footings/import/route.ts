import { acceptFootingImportInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { acceptFootingImport } from "@/lib/services/footings/import-footings";

/** Takes a file of footings into the register as its preview showed it. JSON escapes may double the file's own size. */
export const POST = write({
  body: acceptFootingImportInput,
  limit_bytes: 17_000_000,
  run: acceptFootingImport,
});
