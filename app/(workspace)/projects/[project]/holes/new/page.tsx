import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { HoleForm } from "@/components/holes/hole-form";
import { PageHead } from "@/components/ui/page-head";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { Refusal } from "@/lib/services/errors";
import { readHole } from "@/lib/services/holes/read-hole";
import { listUnits } from "@/lib/services/units/list-units";

export const metadata: Metadata = { title: "New hole · Holdground" };

type Props = { params: Promise<{ project: string }>; searchParams: Promise<{ of?: string }> };

/** The form of a hole: empty for a new one, filled with the current log where one is corrected. */
export default async function NewHolePage({ params, searchParams }: Props) {
  const context = await pageContext((await params).project);
  if (!may(context.roles, "hole:write")) notFound();
  const { of } = await searchParams;
  const hole = of
    ? await readHole(context, { holeId: of }).catch((error: unknown) => {
        if (error instanceof Refusal) notFound();
        throw error;
      })
    : null;
  const { units } = await listUnits(context);
  return (
    <div className="p-6">
      <PageHead
        title={hole ? `Correct the log of ${hole.name}` : "New hole"}
        up={{ href: `/projects/${context.projectId}/holes`, label: "Holes" }}
      >
        {hole
          ? "The corrected log is kept as a new revision; checks of footings near the hole become affected."
          : "Coordinates are on the site grid, levels on the project's datum."}
      </PageHead>
      <HoleForm projectId={context.projectId} units={units} hole={hole} />
    </div>
  );
}
