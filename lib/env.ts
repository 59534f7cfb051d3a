import { z } from "zod";

const httpUrl = z.url({
  protocol: /^https?$/,
  error: "must be an address that begins with http:// or https://",
});
const databaseUrl = z
  .string()
  .regex(/^postgres(ql)?:\/\//, "must be an address that begins with postgresql://");
const smtpUrl = z.string().regex(/^smtps?:\/\//, "must be an address that begins with smtp:// or smtps://");
const text = z.string().min(1, "must not be empty");

/** Every variable the application reads, with what it must look like. docker/ and .env.example name the same ones. */
export const variables = {
  DATABASE_URL: databaseUrl.describe("PostgreSQL, as the role holdground_app"),
  S3_ENDPOINT: httpUrl.describe("The store; browsers must reach it too"),
  S3_REGION: text.describe("The store's region, us-east-1 for MinIO"),
  S3_ACCESS_KEY: text.describe("Key of the store's account"),
  S3_SECRET_KEY: text.describe("Secret of the store's account"),
  S3_BUCKET: text.describe("Private bucket for documents and reports"),
  SMTP_URL: smtpUrl.describe("Mail server, with account where it asks for one"),
  MAIL_FROM: text.describe("Sender of the register's mail"),
  NEXTAUTH_URL: httpUrl.describe("Address that people open, for sign-in"),
  NEXTAUTH_SECRET: z
    .string()
    .min(32, "must be at least 32 characters long")
    .describe("Key that sessions are sealed with"),
  APP_ORIGIN: httpUrl.describe("Address that people open, for links and origin checks"),
  TRUSTED_PROXIES: z
    .string()
    .regex(/^[0-9a-fA-F:., ]+$/, "must be addresses, with commas between them")
    .optional()
    .describe("Addresses of the proxies in front, whose X-Forwarded-For is believed; none when left out"),
  HOLDGROUND_FAULTS: text.optional().describe("Test runs only: opens the named fault points"),
};

const schema = z.object(variables);
export type Env = Readonly<z.infer<typeof schema>>;

const names = Object.keys(variables) as (keyof Env)[];
let parsed: { from: string; env: Env } | undefined;

/**
 * The settings of this process, read at first use and again when they have changed. Throws a sentence that names each
 * variable that is missing or malformed, and never its value.
 */
export function env(): Env {
  const given: Record<string, string | undefined> = {};
  // An empty variable counts as not set: compose files and CI pass them so.
  for (const name of names) given[name] = process.env[name] || undefined;
  const from = JSON.stringify(given);
  if (parsed?.from === from) return parsed.env;

  const result = schema.safeParse(given);
  if (!result.success) throw new Error(complaint(result.error, given));
  parsed = { from, env: Object.freeze(result.data) };
  return parsed.env;
}

function complaint(error: z.ZodError, given: Record<string, string | undefined>): string {
  const faults = new Map<string, string>();
  for (const issue of error.issues) {
    const name = String(issue.path[0]);
    if (!faults.has(name)) faults.set(name, given[name] === undefined ? "is not set" : issue.message);
  }
  return `${[...faults].map(([name, fault]) => `${name} ${fault}`).join("; ")}. See .env.example.`;
}
