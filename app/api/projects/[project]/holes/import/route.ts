import { acceptGroundInput } from "@/lib/contracts/ground";
import { write } from "@/lib/http/handle";
import { acceptGround } from "@/lib/services/holes/accept-ground";

/** Takes a previewed AGS file into the register, whole or not at all. */
export const POST = write({ body: acceptGroundInput, status: 201, run: acceptGround });
