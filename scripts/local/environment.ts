import { readLocal } from "./folders.mjs";
import { givenEnvironment } from "./given.mjs";

/*
 * For commands run by hand (import it first): fills the environment from `.env`, and what is then still missing from
 * what `npm start` has written down about the services it made.
 */
const local: Record<string, string> = readLocal("env.json") ?? {};
Object.assign(process.env, { ...local, ...givenEnvironment() });
