import { z } from "zod";
import { roles } from "@/lib/access/policy";
import { emailAddress } from "./accounts";

const someRoles = z
  .array(z.enum(roles, "There is no such role."), "Choose the roles.")
  .min(1, "Choose at least one role.")
  .max(roles.length, "Each role once.")
  .transform((chosen) => roles.filter((role) => chosen.includes(role)));

/** Invites somebody into the project, by mail. */
export const inviteMemberInput = z.strictObject({ email: emailAddress, roles: someRoles });

/** Gives a member other roles. `seenRoles` are those the writer saw, so that nobody's change is lost. */
export const changeMemberInput = z.strictObject({
  memberId: z.guid("This is not an id."),
  roles: someRoles,
  seenRoles: z.array(z.enum(roles, "There is no such role."), "Say which roles you saw.").max(roles.length),
});

export const removeMemberInput = z.strictObject({ memberId: z.guid("This is not an id.") });
export const cancelInvitationInput = z.strictObject({ invitationId: z.guid("This is not an id.") });

export type Member = {
  id: string;
  name: string;
  qualification: string;
  /** Shown to project leads and to the person, to nobody else. */
  email: string | null;
  roles: string[];
  disabled: boolean;
};
export type Invitation = {
  id: string;
  email: string;
  roles: string[];
  invitedBy: string;
  createdAt: string;
  expiresAt: string;
  /** How far its mail has come: waiting, sent, or why it could not be delivered. */
  mail: "waiting" | "sent" | "failed";
  mailFailure: string | null;
};
export type MemberList = { members: Member[]; invitations: Invitation[] };
