import { readLocal } from "./folders.mjs";
import { givenEnvironment } from "./given.mjs";

/*
 * For commands run by hand (import it first): fills the environment from `.env`, and what is then still missing from
 * what `npm start` has written down about the services it made.
 */
const local: Record<string, string> | undefined = readLocal("env.json");
const given = givenEnvironment();
if (!local && !given.DATABASE_URL) {
  console.error("There is no register here yet: run npm start first, or set what .env.example names.");
  process.exit(2);
}
Object.assign(process.env, { ...local, ...given });
