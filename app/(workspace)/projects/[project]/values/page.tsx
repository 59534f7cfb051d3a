import type { Metadata } from "next";
import { CoveragePanel } from "@/components/values/coverage-panel";
import { NewValueForm } from "@/components/values/new-value-form";
import { ValueList } from "@/components/values/value-list";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { newValueChoices } from "@/lib/services/values/choices";
import { listValues } from "@/lib/services/values/list-values";
import { readCoverage } from "@/lib/services/values/read-coverage";

export const metadata: Metadata = { title: "Bearing values · Holdground" };

/** The register of bearing values of the project, with what is missing in it. */
export default async function ValuesPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  const mayDraft = may(context.roles, "value:draft");
  const [values, coverage, choices] = await Promise.all([
    listValues(context, {}),
    readCoverage(context),
    mayDraft ? newValueChoices(context) : null,
  ]);
  return (
    <div className="p-6">
      <h1 className="text-xl">Bearing values</h1>
      <p className="mt-2 max-w-prose text-ink-2">
        A bearing value holds only for the ground unit, area, levels, breadths, kind of load and water level
        that it states. Outside them there is no value.
      </p>
      <ValueList projectId={context.projectId} initial={values} mayDraft={mayDraft} />
      {choices && (
        <section aria-labelledby="new-title" className="mt-10">
          <h2 id="new-title" className="text-lg">
            Open a value
          </h2>
          <NewValueForm projectId={context.projectId} places={choices.places} />
        </section>
      )}
      <CoveragePanel projectId={context.projectId} initial={coverage} />
    </div>
  );
}
