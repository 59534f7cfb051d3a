import { readSite } from "@/lib/http/site";
import { findPeople } from "@/lib/services/accounts/people";

/** People with accounts, for the site administrator. */
export const GET = readSite(findPeople);
