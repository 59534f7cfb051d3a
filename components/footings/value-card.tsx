import Link from "next/link";
import type { CheckDetail } from "@/lib/contracts/checks";
import { loadBasisTitles } from "@/lib/contracts/footing-words";
import { whole } from "./shown";

/** The revision that a check stands on, with the conditions that an engineer needs in order to use it safely. */
export function ValueCard({ projectId, check }: { projectId: string; check: CheckDetail }) {
  const { value, snapshot } = check;
  const { input, register } = snapshot;
  const stated = input.value;
  const range = (low: number | null, high: number | null, unit: string): string =>
    low === null && high === null ? "not stated" : `${low ?? "…"} to ${high ?? "…"} ${unit}`;
  const rows: [string, string][] = [
    [
      "Net allowable bearing pressure",
      stated.kind === "single" ? `${whole(stated.netAllowable_kPa)} kPa net` : "computed for each footing",
    ],
    ["As the report gives it", `${value.given} ${value.givenBasis}`],
    [
      "Compared with",
      stated.comparedWith === "maximum"
        ? "the maximum edge pressure"
        : "the uniform pressure on the effective area",
    ],
    [
      "Load basis",
      loadBasisTitles[register.valueLoadBasis as keyof typeof loadBasisTitles] ?? register.valueLoadBasis,
    ],
    ["Governed by", value.governedBy],
    ["Breadth", range(stated.minBreadth_m, stated.maxBreadth_m, "m")],
    ["Smallest cover", stated.minFoundingDepth_m === null ? "not stated" : `${stated.minFoundingDepth_m} m`],
    ["Founding level", range(register.lowestFoundingLevel_m, register.highestFoundingLevel_m, "m")],
    [
      "Groundwater assumed",
      stated.groundwaterLevel_m === null ? "none assumed" : `at ${stated.groundwaterLevel_m} m`,
    ],
    ["Unit weight of soil", `${stated.soilUnitWeight_kNm3} kN/m³`],
    [
      "Duration factors",
      `transient ${stated.durationFactors.transient}, accidental ${stated.durationFactors.accidental}`,
    ],
    ["Status", `${value.basis}, ${register.purpose === "preliminary" ? "preliminary" : "for design"}`],
    ...(value.conditions ? [["Other conditions", value.conditions] as [string, string]] : []),
  ];
  return (
    <section aria-labelledby="value-title" className="mt-8">
      <h2 id="value-title" className="text-lg">
        Bearing value used:{" "}
        <Link href={`/projects/${projectId}/values/${check.valueId}`} className="underline">
          {check.valueReference}
        </Link>{" "}
        {check.code}
      </h2>
      <p className="text-ink-2">
        {value.zone}; {value.groundUnit}. It is valid only for the ground, area, levels, breadth, loads and
        water stated; outside them there is no value.
      </p>
      <dl className="mt-2 grid max-w-4xl gap-x-8 sm:grid-cols-2">
        {rows.map(([label, text]) => (
          <div key={label} className="flex justify-between gap-4 border-b border-rule py-1">
            <dt className="text-ink-2">{label}</dt>
            <dd className="text-right">{text}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-2">
        <span className="text-ink-2">Sources: </span>
        {value.sources.length === 0
          ? "none named"
          : value.sources
              .map(({ reference, code, page, clause }) =>
                [`${reference} ${code}`, page === null ? "" : `page ${page}`, clause]
                  .filter(Boolean)
                  .join(", "),
              )
              .join("; ")}
        .
      </p>
    </section>
  );
}
