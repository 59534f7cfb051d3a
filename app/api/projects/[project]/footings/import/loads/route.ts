import { acceptLoadImportInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { acceptLoadImport } from "@/lib/services/loads/import-loads";

/** Takes a file of load combinations into the register as its preview showed it. */
export const POST = write({ body: acceptLoadImportInput, limit_bytes: 17_000_000, run: acceptLoadImport });
