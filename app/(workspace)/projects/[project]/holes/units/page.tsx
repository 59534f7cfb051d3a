import type { Metadata } from "next";
import { UnitsSheet } from "@/components/holes/units-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { listUnits } from "@/lib/services/units/list-units";

export const metadata: Metadata = { title: "Ground units · Holdground" };

/** The ground units of the project and the strata assigned to them. */
export default async function UnitsPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  return (
    <div className="p-6">
      <UnitsSheet
        projectId={context.projectId}
        initial={await listUnits(context)}
        mayWrite={may(context.roles, "unit:write")}
      />
    </div>
  );
}
