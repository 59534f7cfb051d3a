import { randomUUID } from "node:crypto";
import { headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import { cache } from "react";
import type { ProjectId } from "@/lib/contracts/ids";
import { env } from "@/lib/env";
import type { SignedIn } from "@/lib/services/accounts/session-holder";
import type { Visitor } from "@/lib/services/accounts/visitor";
import type { Context } from "@/lib/services/context";
import { rolesInProject } from "@/lib/services/members/roles-in-project";
import { currentPerson } from "./session";
import { visitorOf } from "./site";

/** This site's own address, for pages that check where a sign-in may lead. */
export const siteOrigin = (): string => env().APP_ORIGIN;

/** The signed-in person of a page; sends anybody else to sign in and back here afterwards. */
export async function pagePerson(here: string): Promise<SignedIn> {
  const person = await currentPerson();
  if (!person) redirect(`/sign-in?callbackUrl=${encodeURIComponent(here)}`);
  return person;
}

/** Who opens a page outside any project, for the verbs that belong to none. */
export async function pageVisitor(here: string): Promise<Visitor & { person: SignedIn }> {
  const person = await pagePerson(here);
  return { ...(await visitorOf(await headers())), person };
}

/** The context of a page inside a project; a stranger finds nothing there. */
export const pageContext = cache(async (project: string): Promise<Context> => {
  const person = await pagePerson(`/projects/${project}`);
  if (!/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(project)) notFound();
  const projectId = project as ProjectId;
  const roles = await rolesInProject(person.id, projectId);
  if (roles.length === 0) notFound();
  return { person, projectId, roles, requestId: randomUUID() };
});
