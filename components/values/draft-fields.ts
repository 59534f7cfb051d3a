import { type ValueFieldName, valueFields, valueWords } from "@/lib/contracts/value-words";
import type { DraftContent } from "@/lib/contracts/values";

/** One field of the draft: typed in a line, chosen among few (all shown, none chosen beforehand), or written at length. */
export type DraftField = {
  name: Exclude<keyof DraftContent, "sources">;
  kind: "typed" | "choice" | "long" | "date";
  label: string;
  unit: string;
  hint?: string;
  options?: readonly (readonly [value: string, label: string])[];
  /** Shown only where the draft so far asks for it. */
  when?: (draft: DraftContent) => boolean;
};
export type DraftGroup = { title: string; note?: string; fields: DraftField[] };

const labelOf = (name: string): { label: string; unit: string } =>
  valueFields.find((field) => field.name === (name as ValueFieldName)) ?? { label: name, unit: "" };

const typed = (name: DraftField["name"], hint?: string, when?: DraftField["when"]): DraftField => ({
  name,
  kind: "typed",
  hint,
  when,
  ...labelOf(name),
});
const choice = (name: DraftField["name"] & keyof typeof valueWords, hint?: string): DraftField => ({
  name,
  kind: "choice",
  hint,
  options: Object.entries(valueWords[name]),
  ...labelOf(name),
});
const long = (name: DraftField["name"], hint?: string): DraftField => ({
  name,
  kind: "long",
  hint,
  ...labelOf(name),
});

const unconfirmed = (draft: DraftContent) => draft.basis === "assumed" || draft.basis === "presumptive";
const granted = (draft: DraftContent) => draft.transientIncrease === "granted";

/** The draft in the order in which an engineer reads a recommendation. Sources have a place of their own. */
export const draftGroups: DraftGroup[] = [
  {
    title: "The figure",
    fields: [
      {
        ...typed("given", "With its unit: 250 kPa, 3 ksf, 15 t/m2. A number alone is read in kPa."),
        label: "Pressure as the report gives it",
      },
      choice(
        "givenBasis",
        "State which weights are included. If the report does not say, ask its author; do not guess.",
      ),
      typed(
        "givenOverburden_kPa",
        "At the founding level that the figure is for.",
        (draft) => draft.givenBasis === "gross",
      ),
      choice("factorConvention"),
      typed("factorOfSafety"),
      choice("comparedWith"),
    ],
  },
  {
    title: "Loads",
    note: "Allowable values go with working loads, design resistances with factored loads. Never mix them.",
    fields: [
      choice("loadBasis"),
      choice(
        "transientIncrease",
        "Only where the report and the code both allow it, and never on combinations that already reduce the short-term load.",
      ),
      typed("transientFactor", "1 where none is granted.", granted),
      typed("accidentalFactor", "1 where none is granted.", granted),
    ],
  },
  {
    title: "Settlement",
    note: "A pressure may be limited by settlement: a wider base settles more even where strength is ample.",
    fields: [choice("governedBy"), typed("settlementLimit_mm"), typed("settlementPredicted_mm")],
  },
  {
    title: "Where it holds",
    note: "Left empty, there is no such limit.",
    fields: [
      typed("minBreadth_m", "Of the smaller side of the pad."),
      typed("maxBreadth_m", "Of the smaller side of the pad."),
      typed("minFoundingDepth_m"),
      typed("highestFoundingLevel_m", "On the project's datum."),
      typed("lowestFoundingLevel_m", "On the project's datum."),
    ],
  },
  {
    title: "Ground and water",
    note: "Water levels vary with the season; a hole that was dry while drilling proves no low level.",
    fields: [
      typed("groundwaterLevel_m", "Left empty where no water was met."),
      long("groundwaterBasis", "As: standing in BH3 on 12 May; or: not met to 12 m in BH1 to BH6."),
      typed("soilUnitWeight_kNm3"),
      choice("drainage"),
      long("neighbours"),
      long("conditions"),
    ],
  },
  {
    title: "What it rests on",
    fields: [
      choice("basis"),
      { name: "confirmBy", kind: "date", when: unconfirmed, ...labelOf("confirmBy") },
      typed("confirmWho", undefined, unconfirmed),
      choice("purpose"),
    ],
  },
];

/** What led to the revision: asked last, always anew. */
export const reasonFields: DraftField[] = [
  {
    name: "reasonCode",
    kind: "choice",
    label: "What led to this revision",
    unit: "",
    options: Object.entries(valueWords.reasonCode),
  },
  { name: "reason", kind: "long", label: "Reason, for everyone who relies on the value", unit: "" },
];
