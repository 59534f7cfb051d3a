import type { CriteriaRow } from "@/lib/contracts/projects";
import { FieldsForm } from "./fields-form";
import { criteriaFieldsGroup } from "./project-fields";

type Props = { projectId: string; revision: number; mayChange: boolean; criteria: CriteriaRow[] };

/** The criteria in force, the form to change them under the next number, and all that were in force before. */
export function CriteriaPanel({ projectId, revision, mayChange, criteria }: Props) {
  const [current] = criteria;
  return (
    <section aria-labelledby="criteria-title" className="mt-10">
      <h2 id="criteria-title" className="text-lg">
        Criteria of checks
      </h2>
      {mayChange && current ? (
        <FieldsForm
          path={`/api/projects/${projectId}/criteria`}
          method="POST"
          revision={revision}
          groups={[
            criteriaFieldsGroup(current, ""),
            {
              fields: [
                {
                  name: "reason",
                  label: "Reason for the change",
                  kind: "text",
                  value: "",
                  hint: "Every check made so far is affected from then on, until it is run again.",
                },
              ],
            },
          ]}
          empties={["reason"]}
          submit={`Put criteria ${current.number + 1} in force`}
          said="The new criteria are in force."
        />
      ) : null}
      <table className="mt-6 w-full text-sm">
        <caption className="text-left text-ink-2">Criteria so far, the ones in force first</caption>
        <thead>
          <tr className="border-b border-rule text-left">
            {[
              "No.",
              "Sliding",
              "Overturning",
              "Uplift",
              "δ (degrees)",
              "a (kPa)",
              "Contact, transient",
              "accidental",
              "Set by",
              "On",
              "Reason",
            ].map((head) => (
              <th key={head} scope="col" className="py-1 pr-3 font-normal">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {criteria.map((row) => (
            <tr key={row.number} className="border-b border-rule align-top">
              <th scope="row" className="py-1 pr-3 text-left font-normal tabular-nums">
                {row.number}
              </th>
              {[
                row.slidingFactor,
                row.overturningFactor,
                row.upliftFactor,
                row.interfaceAngle_deg,
                row.adhesion_kPa,
                row.transientMinContactRatio,
                row.accidentalMinContactRatio,
              ].map((figure, at) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: columns never change their order
                <td key={at} className="py-1 pr-3 tabular-nums">
                  {figure}
                </td>
              ))}
              <td className="py-1 pr-3">{row.setBy}</td>
              <td className="py-1 pr-3 tabular-nums">{row.setAt.slice(0, 10)}</td>
              <td className="py-1">{row.reason}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
