import type { Metadata } from "next";
import { AuditPanel } from "@/components/settings/audit-panel";
import { CriteriaPanel } from "@/components/settings/criteria-panel";
import { FieldsForm } from "@/components/settings/fields-form";
import { MembersPanel } from "@/components/settings/members-panel";
import { projectFields } from "@/components/settings/project-fields";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { listMembers } from "@/lib/services/members/list-members";
import { listCriteria, projectFacts } from "@/lib/services/projects/project-facts";
import { readAudit } from "@/lib/services/projects/read-audit";

export const metadata: Metadata = { title: "Settings · Holdground" };

/** Grid, datum, units, criteria, members and the audit trail of the project. */
export default async function SettingsPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  const mayAudit = may(context.roles, "audit:read");
  const [facts, { criteria }, members, audit] = await Promise.all([
    projectFacts(context),
    listCriteria(context),
    listMembers(context),
    mayAudit ? readAudit(context, {}) : null,
  ]);
  const mayChange = may(context.roles, "project:change");
  const groups = projectFields(facts);
  return (
    <div className="p-6">
      <h1 className="text-xl">Settings</h1>
      {mayChange ? (
        <FieldsForm
          path={`/api/projects/${facts.id}`}
          method="PATCH"
          revision={facts.revision}
          onlyChanged
          empties={["reason"]}
          groups={[
            ...groups,
            {
              fields: [
                {
                  name: "reason",
                  label: "Reason, when grid or datum changes",
                  kind: "text",
                  value: "",
                  hint: "Needed once holes, zones or footings are recorded.",
                },
              ],
            },
          ]}
          submit="Save the settings"
          said="The settings are saved."
        />
      ) : (
        <dl className="mt-4 grid max-w-3xl grid-cols-[auto_1fr] gap-x-6 gap-y-1">
          {groups.flatMap((group) =>
            group.fields.map((field) => (
              <div key={field.name} className="contents">
                <dt className="text-ink-2">{field.unit ? `${field.label} (${field.unit})` : field.label}</dt>
                <dd>{shown(field)}</dd>
              </div>
            )),
          )}
        </dl>
      )}
      <CriteriaPanel
        projectId={facts.id}
        revision={facts.revision}
        mayChange={may(context.roles, "criteria:change")}
        criteria={criteria}
      />
      <MembersPanel
        {...members}
        projectId={facts.id}
        mayChange={may(context.roles, "member:change")}
        ownId={context.person.id}
      />
      {audit && <AuditPanel projectId={facts.id} first={audit} />}
    </div>
  );
}

function shown(field: {
  value: string | number | boolean | null;
  options?: readonly (readonly [string, string])[];
}): string {
  const named = field.options?.find(([value]) => value === field.value)?.[1];
  return named ?? (field.value === null || field.value === "" ? "not stated" : String(field.value));
}
