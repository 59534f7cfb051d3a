"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { Notice } from "@/components/account/notice";
import { TextField } from "@/components/account/text-field";
import { type Role, roles, roleTitles } from "@/lib/access/policy";
import { type Answer, type Refused, send } from "@/lib/client/send";
import type { Invitation, Member, MemberList } from "@/lib/contracts/members";

type Props = MemberList & { projectId: string; mayChange: boolean; ownId: string };

/** Who is in the project with which roles, open invitations, and the form to invite. */
export function MembersPanel({ projectId, members, invitations, mayChange, ownId }: Props) {
  const router = useRouter();
  const [refused, setRefused] = useState<Refused>();
  const [said, setSaid] = useState("");
  const path = `/api/projects/${projectId}/members`;
  const after = (answer: Answer<unknown>, sentence: string): boolean => {
    setRefused(answer.done ? undefined : answer.refused);
    setSaid(answer.done ? sentence : "");
    if (answer.done) router.refresh();
    return answer.done;
  };
  return (
    <section aria-labelledby="members-title" className="mt-10">
      <h2 id="members-title" className="text-lg">
        Members
      </h2>
      {refused && (
        <Notice kind="refused">{[refused.detail, ...Object.values(refused.fields)].join(" ")}</Notice>
      )}
      {said && <Notice kind="done">{said}</Notice>}
      <ul className="mt-4 divide-y divide-rule border-y border-rule">
        {members.map((member) => (
          <MemberLine
            key={`${member.id} ${member.roles.join()}`}
            member={member}
            mayChange={mayChange}
            own={member.id === ownId}
            onRoles={async (chosen) =>
              after(
                await send(`${path}/${member.id}`, "PUT", { roles: chosen, seenRoles: member.roles }),
                `${member.name} has other roles from the next request on.`,
              )
            }
            onRemove={async () =>
              after(
                await send(`${path}/${member.id}`, "DELETE"),
                `${member.name} is no longer in the project.`,
              )
            }
          />
        ))}
      </ul>
      {mayChange && (
        <>
          <h3 className="mt-8 font-semibold">Open invitations</h3>
          {invitations.length === 0 ? (
            <p className="mt-2 text-ink-2">There is none.</p>
          ) : (
            <ul className="mt-2 divide-y divide-rule border-y border-rule">
              {invitations.map((invitation) => (
                <InvitationLine
                  key={invitation.id}
                  invitation={invitation}
                  onCancel={async () =>
                    after(
                      await send(`${path}/invitations/${invitation.id}`, "DELETE"),
                      `The invitation to ${invitation.email} is withdrawn.`,
                    )
                  }
                />
              ))}
            </ul>
          )}
          <InviteForm
            problems={refused?.fields ?? {}}
            onInvite={async (email, chosen) =>
              after(
                await send(path, "POST", { email, roles: chosen }),
                `The invitation to ${email} is on its way.`,
              )
            }
          />
        </>
      )}
    </section>
  );
}

function RoleBoxes({
  held,
  prefix,
  disabled,
}: {
  held: readonly string[];
  prefix: string;
  disabled?: boolean;
}) {
  return (
    <fieldset disabled={disabled} className="flex flex-wrap gap-x-4 gap-y-1">
      <legend className="sr-only">Roles</legend>
      {roles.map((role) => (
        <label key={role} className="flex items-center gap-1.5">
          <input
            type="checkbox"
            name="roles"
            value={role}
            defaultChecked={held.includes(role)}
            id={`${prefix}-${role}`}
          />
          {roleTitles[role]}
        </label>
      ))}
    </fieldset>
  );
}

const chosenIn = (form: HTMLFormElement): string[] => new FormData(form).getAll("roles").map(String);

function MemberLine(props: {
  member: Member;
  mayChange: boolean;
  own: boolean;
  onRoles: (roles: string[]) => Promise<boolean>;
  onRemove: () => Promise<boolean>;
}) {
  const { member, mayChange, own, onRoles, onRemove } = props;
  const [asking, setAsking] = useState(false);
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    await onRoles(chosenIn(event.currentTarget));
  };
  return (
    <li className="py-2">
      <form method="post" onSubmit={submit} className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <span className="min-w-56">
          {member.name}
          {own && <span className="text-ink-2"> (you)</span>}
          {member.disabled && <span className="text-ink-2"> (account shut)</span>}
          {member.email && <span className="block text-sm text-ink-2">{member.email}</span>}
        </span>
        {mayChange ? (
          <>
            <RoleBoxes held={member.roles} prefix={member.id} />
            <button type="submit" className="underline" aria-label={`Change roles of ${member.name}`}>
              Change roles
            </button>
            {asking ? (
              <span>
                Take {member.name} out of the project?{" "}
                <button type="button" className="underline" onClick={onRemove}>
                  Yes, remove
                </button>{" "}
                <button type="button" className="underline" onClick={() => setAsking(false)}>
                  No
                </button>
              </span>
            ) : (
              <button
                type="button"
                className="underline"
                aria-label={`Remove ${member.name}`}
                onClick={() => setAsking(true)}
              >
                Remove
              </button>
            )}
          </>
        ) : (
          <span>{member.roles.map((role) => roleTitles[role as Role]).join(", ")}</span>
        )}
      </form>
    </li>
  );
}

const mailWords = {
  waiting: "mail waits to be sent",
  sent: "mail sent",
  failed: "mail could not be delivered",
};

function InvitationLine({
  invitation,
  onCancel,
}: {
  invitation: Invitation;
  onCancel: () => Promise<boolean>;
}) {
  const { email, roles: held, invitedBy, expiresAt, mail, mailFailure } = invitation;
  const over = new Date(expiresAt).getTime() < Date.now();
  return (
    <li className="flex flex-wrap items-center gap-x-6 gap-y-1 py-2">
      <span className="min-w-56">{email}</span>
      <span>{held.map((role) => roleTitles[role as Role]).join(", ")}</span>
      <span className="text-sm text-ink-2">
        by {invitedBy}, {over ? "too old to be used" : `until ${expiresAt.slice(0, 10)}`}, {mailWords[mail]}
        {mailFailure && `: ${mailFailure}`}
      </span>
      <button
        type="button"
        className="underline"
        aria-label={`Withdraw the invitation to ${email}`}
        onClick={onCancel}
      >
        Withdraw
      </button>
    </li>
  );
}

function InviteForm(props: {
  problems: Record<string, string>;
  onInvite: (email: string, roles: string[]) => Promise<boolean>;
}) {
  const { problems, onInvite } = props;
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = event.currentTarget;
    const email = String(new FormData(form).get("email") ?? "");
    if (await onInvite(email, chosenIn(form))) form.reset();
  };
  return (
    <form method="post" onSubmit={submit} noValidate className="mt-6 max-w-3xl">
      <h3 className="font-semibold">Invite somebody</h3>
      <TextField name="email" label="E-mail" type="email" autoComplete="off" problem={problems.email} />
      <div className="mt-3">
        <RoleBoxes held={[]} prefix="invite" />
        {problems.roles && <p className="mt-1 text-sm text-fails-text">{problems.roles}</p>}
      </div>
      <button type="submit" className="mt-4 bg-action px-4 py-2 text-on-action">
        Send the invitation
      </button>
    </form>
  );
}
