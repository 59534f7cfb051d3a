import type { Metadata } from "next";
import { PlanSheet } from "@/components/plan/plan-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { listUnits } from "@/lib/services/units/list-units";

export const metadata: Metadata = { title: "Plan · Holdground" };

/** The plan of the site. */
export default async function PlanPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  return (
    <div className="p-6">
      <PlanSheet
        projectId={context.projectId}
        mayDraw={may(context.roles, "zone:write")}
        units={await listUnits(context)}
      />
    </div>
  );
}
