import type { Metadata } from "next";
import Link from "next/link";
import { FootingForm } from "@/components/footings/footing-form";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { footingChoices } from "@/lib/services/footings/footing-choices";
import { projectFacts } from "@/lib/services/projects/project-facts";

export const metadata: Metadata = { title: "New footing · Holdground" };

/** A new footing: size, place and levels. Loads and the link to a value follow on its own sheet. */
export default async function NewFootingPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  const [facts, choices] = await Promise.all([projectFacts(context), footingChoices(context)]);
  return (
    <div className="p-6">
      <p>
        <Link href={`/projects/${context.projectId}/footings`} className="underline">
          Footings
        </Link>
      </p>
      <h1 className="text-xl">New footing</h1>
      {may(context.roles, "footing:write") ? (
        <FootingForm
          projectId={context.projectId}
          owners={choices.owners}
          grid={facts.gridName}
          datum={facts.datumName}
        />
      ) : (
        <p className="mt-4">Footings are registered by the structural engineer.</p>
      )}
    </div>
  );
}
