import { z } from "zod";
import { normalEmail } from "./email-address";
import { plainText } from "./plain-text";

/** An e-mail address, brought to the form in which it is kept. */
export const emailAddress = z.string("An e-mail address is needed.").transform((typed, issue) => {
  const email = normalEmail(typed);
  if (email !== null) return email;
  issue.addIssue({ code: "custom", message: "This is not an e-mail address such as name@office.example." });
  return z.NEVER;
});

/** A person's name on one line. */
export const personName = plainText(120)
  .transform((typed) => typed.replace(/\s+/g, " ").trim())
  .refine((name) => name !== "", "A name is needed.")
  .refine((name) => !/\p{Cc}/u.test(name), "A name has no control characters.");

/** The shortest password taken; longer ones are stronger than ones with odd signs. */
export const PASSWORD_MIN = 10;
const COMMON = /^(password|passwort|qwerty|letmein|welcome|iloveyou|holdground|abcdef|123456|administrator)/i;

/** A new password: long enough, not one of those that everybody tries first. */
export const newPassword = z
  .string("A password is needed.")
  .min(PASSWORD_MIN, `At least ${PASSWORD_MIN} characters.`)
  .max(200, "At most 200 characters.")
  .refine((typed) => new Set(typed).size >= 5, "At least five different characters.")
  .refine(
    (typed) => !(COMMON.test(typed) && typed.length < 16),
    "This begins like the passwords that are tried first.",
  );

const token = z.string("The link is not complete.").regex(/^[A-Za-z0-9_-]{43}$/, "The link is not complete.");

/** Asks for a link to set a new password. */
export const requestResetInput = z.strictObject({ email: emailAddress });

/** Sets a new password with the link from the mail. */
export const resetPasswordInput = z.strictObject({ token, password: newPassword });

/** Changes the own password; every other session of this person ends. */
export const changePasswordInput = z.strictObject({
  currentPassword: z
    .string("The current password is needed.")
    .min(1, "The current password is needed.")
    .max(200),
  password: newPassword,
});

/** Accepts an invitation; name and password are for those who have no account yet. */
export const acceptInvitationInput = z.strictObject({
  token,
  name: personName.optional(),
  password: newPassword.optional(),
});

/** Changes what the account says of the person. */
export const changeAccountInput = z.strictObject({ name: personName, qualification: plainText(200) });

/** Opens or shuts an account, for the site administrator. */
export const openAccountInput = z.strictObject({
  personId: z.guid("This is not an id."),
  open: z.boolean("Say whether the account is open."),
});

/** Finds people, for the site administrator. */
export const findPeopleInput = z.strictObject({ search: plainText(120).default("") });

export type Account = {
  id: string;
  name: string;
  email: string;
  qualification: string;
  siteAdministrator: boolean;
};
export type PersonRow = Omit<Account, "qualification"> & { disabledAt: string | null };
