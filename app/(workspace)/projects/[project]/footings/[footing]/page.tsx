import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { FootingSheet } from "@/components/footings/footing-sheet";
import { may } from "@/lib/access/policy";
import type { FootingId } from "@/lib/contracts/ids";
import { pageContext } from "@/lib/http/page";
import { readCheck } from "@/lib/services/checks/read-check";
import { Invalid, NotFound } from "@/lib/services/errors";
import { footingChoices } from "@/lib/services/footings/footing-choices";
import { readFooting } from "@/lib/services/footings/read-footing";
import { projectFacts } from "@/lib/services/projects/project-facts";

export const metadata: Metadata = { title: "Footing · Holdground" };

/** One footing with its last check. */
export default async function FootingPage({
  params,
}: {
  params: Promise<{ project: string; footing: string }>;
}) {
  const { project, footing: footingId } = await params;
  const context = await pageContext(project);
  const footing = await readFooting(context, { footingId: footingId as FootingId }).catch(
    (error: unknown) => {
      if (error instanceof NotFound || error instanceof Invalid) notFound();
      throw error;
    },
  );
  const [facts, choices, check] = await Promise.all([
    projectFacts(context),
    footingChoices(context),
    footing.check ? readCheck(context, { checkId: footing.check.id }) : null,
  ]);
  return (
    <FootingSheet
      projectId={context.projectId}
      first={footing}
      firstCheck={check}
      owners={choices.owners}
      values={choices.values}
      grid={facts.gridName}
      datum={facts.datumName}
      today={new Date().toISOString().slice(0, 10)}
      may={{
        write: may(context.roles, "footing:write"),
        link: may(context.roles, "footing:link"),
        check: may(context.roles, "check:run"),
        stage: may(context.roles, "stage:record"),
      }}
    />
  );
}
