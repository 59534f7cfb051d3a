import type { Metadata } from "next";
import Link from "next/link";
import { AccountLine } from "@/components/account/account-line";
import { FieldsForm } from "@/components/settings/fields-form";
import { criteriaFieldsGroup, projectFields } from "@/components/settings/project-fields";
import { type Role, roleTitles } from "@/lib/access/policy";
import { pageVisitor } from "@/lib/http/page";
import { myProjects } from "@/lib/services/projects/my-projects";

export const metadata: Metadata = { title: "Projects · Holdground" };

/** The own projects; for a site administrator also the form that opens one. */
export default async function ProjectsPage() {
  const visitor = await pageVisitor("/projects");
  const { projects } = await myProjects(visitor);
  return (
    <main className="mx-auto max-w-4xl p-6">
      <AccountLine name={visitor.person.name} siteAdministrator={visitor.person.siteAdministrator} />
      <h1 className="mt-6 text-xl">Projects</h1>
      {projects.length === 0 ? (
        <p className="mt-4 text-ink-2">
          You are in no project yet. A project lead invites people by mail; the link in it brings you here.
        </p>
      ) : (
        <ul className="mt-4 divide-y divide-rule border-y border-rule">
          {projects.map((project) => (
            <li key={project.id} className="py-3">
              <Link href={`/projects/${project.id}`} className="underline">
                {project.number} {project.title}
              </Link>
              <span className="block text-sm text-ink-2">
                {project.client && `${project.client} · `}
                {project.roles.map((role) => roleTitles[role as Role]).join(", ")}
              </span>
            </li>
          ))}
        </ul>
      )}
      {visitor.person.siteAdministrator && (
        <details className="mt-10">
          <summary className="text-lg">Open a project</summary>
          <FieldsForm
            path="/api/projects"
            method="POST"
            groups={[
              ...projectFields(),
              criteriaFieldsGroup(undefined, "criteria."),
              {
                title: "Project lead",
                note: "Gets a mail; without an account yet, a link to choose a password.",
                fields: [
                  { name: "leadName", label: "Name", kind: "text", value: "" },
                  { name: "leadEmail", label: "E-mail", kind: "text", value: "" },
                ],
              },
            ]}
            submit="Open the project"
            said="The project is open; its lead has been written to. You are not a member of it yourself."
          />
        </details>
      )}
    </main>
  );
}
