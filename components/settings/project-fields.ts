import { commonPractice } from "@/lib/contracts/common-practice";
import type { CriteriaFields, ProjectFacts } from "@/lib/contracts/projects";
import type { FieldGroup } from "./fields-form";

type Settings = Omit<ProjectFacts, "id" | "roles" | "criteria" | "currentCriteria" | "revision">;

const empty = {
  number: "",
  title: "",
  client: "",
  gridName: "",
  epsgCode: null,
  gridOriginEasting_m: 0,
  gridOriginNorthing_m: 0,
  gridRotation_deg: 0,
  gridScale: 1,
  datumName: "",
  structuralZero_m: null,
  unitSystem: null,
  reportingStandard: "",
};

/** The settings of a project as groups of fields; without a project they are empty, and units are left to choose. */
export function projectFields(project?: Settings): FieldGroup[] {
  const at = project ?? empty;
  return [
    {
      title: "Project",
      fields: [
        { name: "number", label: "Number", kind: "text", value: at.number },
        { name: "title", label: "Title", kind: "text", value: at.title },
        { name: "client", label: "Client", kind: "text", value: at.client },
        {
          name: "reportingStandard",
          label: "Reporting standard",
          kind: "text",
          value: at.reportingStandard,
          hint: "As the investigation describes soil and rock, such as ISO 14688-1 and 14689.",
        },
      ],
    },
    {
      title: "Site grid and datum",
      note: "Every coordinate and level of the project is read by these. No hole and no footing is recorded without them.",
      fields: [
        { name: "gridName", label: "Name of the site grid", kind: "text", value: at.gridName },
        {
          name: "epsgCode",
          label: "EPSG code of the national grid",
          kind: "number",
          value: at.epsgCode,
          optional: true,
          hint: "Empty when the site grid stands alone.",
        },
        {
          name: "gridOriginEasting_m",
          label: "Origin, easting",
          kind: "number",
          unit: "m",
          value: at.gridOriginEasting_m,
        },
        {
          name: "gridOriginNorthing_m",
          label: "Origin, northing",
          kind: "number",
          unit: "m",
          value: at.gridOriginNorthing_m,
        },
        {
          name: "gridRotation_deg",
          label: "Rotation",
          kind: "number",
          unit: "degrees",
          value: at.gridRotation_deg,
          hint: "Of site north against grid north, anticlockwise.",
        },
        {
          name: "gridScale",
          label: "Scale",
          kind: "number",
          value: at.gridScale,
          hint: "Site metres to a grid metre.",
        },
        {
          name: "datumName",
          label: "Vertical datum",
          kind: "text",
          value: at.datumName,
          hint: "By name, such as “Site datum, +0.00 = 21.350 m above sea level”.",
        },
        {
          name: "structuralZero_m",
          label: "Structural zero",
          kind: "number",
          unit: "m on the datum",
          value: at.structuralZero_m,
          optional: true,
        },
      ],
    },
    {
      title: "Units",
      note: "Numbers are kept in SI. These are the units in which they are shown and printed, with the unit beside each.",
      fields: [
        {
          name: "unitSystem",
          label: "Units shown",
          kind: "choice",
          value: at.unitSystem,
          options: [
            ["si", "kN, m, kPa"],
            ["kip-ft", "kip, ft, ksf"],
            ["tonne-metre", "tonne-force, m, t/m²"],
          ],
        },
      ],
    },
  ];
}

/** The criteria of checks as one group. Without any, common practice is offered; the angle under the base never is. */
export function criteriaFieldsGroup(
  criteria: CriteriaFields | undefined,
  prefix: "criteria." | "",
): FieldGroup {
  const at = { interfaceAngle_deg: null, ...commonPractice, ...criteria };
  const practice = (name: keyof typeof commonPractice) =>
    `Common practice: ${typeof commonPractice[name] === "boolean" ? "yes" : commonPractice[name]}.`;
  const number = (
    name: Exclude<keyof typeof commonPractice, "permanentWithinMiddleThird">,
    label: string,
    unit?: string,
  ) => ({
    name: `${prefix}${name}`,
    label,
    kind: "number" as const,
    unit,
    value: at[name],
    hint: practice(name),
  });
  return {
    title: "Criteria of checks",
    note: "Figures filled in beforehand are common practice and bind nobody: the code that governs and the engineer in charge do. Look at each one.",
    fields: [
      number("slidingFactor", "Factor against sliding"),
      number("overturningFactor", "Factor against overturning"),
      number("upliftFactor", "Factor against uplift"),
      {
        name: `${prefix}interfaceAngle_deg`,
        label: "Angle of friction under the base",
        kind: "number",
        unit: "degrees",
        value: at.interfaceAngle_deg,
        hint: "Depends on the ground and on how the base is cast: no common value is offered.",
      },
      number("adhesion_kPa", "Adhesion under the base", "kPa"),
      {
        name: `${prefix}permanentWithinMiddleThird`,
        label: "Permanent loads stay within the middle third",
        kind: "yes-no",
        value: at.permanentWithinMiddleThird,
        hint: practice("permanentWithinMiddleThird"),
      },
      number("transientMinContactRatio", "Least contact ratio, transient loads"),
      number("accidentalMinContactRatio", "Least contact ratio, accidental loads"),
      number("nearestHoleLimit_m", "Farthest hole that speaks for a footing", "m"),
    ],
  };
}
