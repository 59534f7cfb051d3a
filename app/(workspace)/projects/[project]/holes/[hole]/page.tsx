import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { HoleSheet } from "@/components/holes/hole-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { Refusal } from "@/lib/services/errors";
import { readHole } from "@/lib/services/holes/read-hole";
import { listUnits } from "@/lib/services/units/list-units";

export const metadata: Metadata = { title: "Hole · Holdground" };

type Props = { params: Promise<{ project: string; hole: string }> };

/** One exploratory hole with its log. */
export default async function HolePage({ params }: Props) {
  const { project, hole } = await params;
  const context = await pageContext(project);
  const page = await readHole(context, { holeId: hole }).catch((error: unknown) => {
    if (error instanceof Refusal) notFound();
    throw error;
  });
  return (
    <div className="p-6">
      <HoleSheet
        projectId={context.projectId}
        initial={page}
        units={await listUnits(context)}
        mayWrite={may(context.roles, "hole:write")}
      />
    </div>
  );
}
