import type { ReactNode } from "react";
import { AccountLine } from "@/components/account/account-line";
import { LiveProject } from "@/components/account/live-project";
import { pageContext } from "@/lib/http/page";
import { currentPerson } from "@/lib/http/session";
import { projectFacts } from "@/lib/services/projects/project-facts";

type Props = { children: ReactNode; params: Promise<{ project: string }> };

/** What every sheet of a project stands in. A stranger finds nothing here, and each sheet asks again for itself. */
export default async function ProjectLayout({ children, params }: Props) {
  const context = await pageContext((await params).project);
  const facts = await projectFacts(context);
  return (
    <LiveProject projectId={facts.id}>
      <header className="px-6 pt-4">
        <AccountLine
          name={context.person.name}
          siteAdministrator={(await currentPerson())?.siteAdministrator ?? false}
        />
        <p className="mt-2 text-sm text-ink-2">
          {facts.number} {facts.title} · {facts.gridName} · {facts.datumName}
        </p>
      </header>
      {children}
    </LiveProject>
  );
}
