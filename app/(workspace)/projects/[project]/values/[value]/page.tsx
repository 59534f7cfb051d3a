import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ValueSheet } from "@/components/values/value-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { NotFound } from "@/lib/services/errors";
import { draftChoices } from "@/lib/services/values/choices";
import { readValue } from "@/lib/services/values/read-value";

export const metadata: Metadata = { title: "Bearing value · Holdground" };

type Params = { params: Promise<{ project: string; value: string }> };

/** One bearing value: in force, in draft and in history. */
export default async function ValuePage({ params }: Params) {
  const { project, value } = await params;
  const context = await pageContext(project);
  if (!/^[0-9a-f-]{36}$/i.test(value)) notFound();
  const { roles } = context;
  const [detail, choices] = await Promise.all([
    readValue(context, { valueId: value }).catch((error) => {
      if (error instanceof NotFound) notFound();
      throw error;
    }),
    may(roles, "value:draft") ? draftChoices(context) : { documents: [] },
  ]);
  return (
    <div className="p-6">
      <ValueSheet
        projectId={context.projectId}
        initial={detail}
        documents={choices.documents}
        rights={{
          personId: context.person.id,
          draft: may(roles, "value:draft"),
          check: may(roles, "revision:check"),
          issue: may(roles, "revision:issue"),
          withdraw: may(roles, "revision:withdraw"),
        }}
      />
    </div>
  );
}
