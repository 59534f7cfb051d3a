import type { ReactNode } from "react";
import { LiveProject } from "@/components/account/live-project";
import { Workspace } from "@/components/sheet/workspace";
import { type Role, roleTitles } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { currentPerson } from "@/lib/http/session";
import { projectFacts } from "@/lib/services/projects/project-facts";
import { unitOf } from "@/lib/units/format-quantity";

type Props = { children: ReactNode; params: Promise<{ project: string }> };

/** What every sheet of a project stands in. A stranger finds nothing here, and each sheet asks again for itself. */
export default async function ProjectLayout({ children, params }: Props) {
  const context = await pageContext((await params).project);
  const [facts, person] = await Promise.all([projectFacts(context), currentPerson()]);
  const units = (["length", "force", "pressure"] as const).map((kind) => unitOf(kind, facts.unitSystem));
  return (
    <LiveProject projectId={facts.id}>
      <Workspace
        projectId={facts.id}
        facts={{
          number: facts.number,
          title: facts.title,
          grid: facts.epsgCode === null ? facts.gridName : `${facts.gridName} (EPSG ${facts.epsgCode})`,
          datum: facts.datumName,
          units: units.join(" · "),
          roles: context.roles.map((role: Role) => roleTitles[role]),
          person: context.person.name,
          siteAdministrator: person?.siteAdministrator ?? false,
        }}
      >
        {children}
      </Workspace>
    </LiveProject>
  );
}
