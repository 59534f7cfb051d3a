import type { Metadata } from "next";
import { HoleList } from "@/components/holes/hole-list";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { listHoles } from "@/lib/services/holes/list-holes";

export const metadata: Metadata = { title: "Holes · Holdground" };

/** The exploratory holes of the project. */
export default async function HolesPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  return (
    <div className="p-6">
      <HoleList
        projectId={context.projectId}
        initial={await listHoles(context)}
        mayWrite={may(context.roles, "hole:write")}
      />
    </div>
  );
}
