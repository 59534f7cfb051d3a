import { hash, verify } from "@node-rs/argon2";

/** argon2id with 19 MiB, two passes, one lane (OWASP password storage cheat sheet). */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The hash of 32 random bytes that nobody kept: an absent account is verified against it, and takes as long. */
const NOBODY =
  "$argon2id$v=19$m=19456,t=2,p=1$5pCvasmtT6jBdNhCixGbOA$VGiBzvNkxLBxHb85sooKfZmxrfdORQ6+qDz6tOHGAXk";

/** Two spellings of one password in Unicode are one password. */
const spelled = (password: string) => password.normalize("NFKC");

/** The argon2id hash under which a password is kept. */
export const hashPassword = (password: string): Promise<string> => hash(spelled(password), COST);

/** True when the password is the one under this hash; for an account without one it takes as long and is false. */
export async function isPassword(
  passwordHash: string | null | undefined,
  password: string,
): Promise<boolean> {
  const matches = await verify(passwordHash ?? NOBODY, spelled(password)).catch(() => false);
  return matches && passwordHash != null;
}
