import { defineMethod } from "@/lib/methods/define-method";
import { checkFooting } from "./check-footing";
import { explainCheck } from "./explain-check";
import { footingCheckInput, footingCheckOutput } from "./input";
import { ENGINE_VERSION } from "./version";

/** The whole check as a method of the list. */
export const footingCheck = defineMethod({
  id: "footing-check",
  version: ENGINE_VERSION,
  title: "One footing against one bearing value",
  source: ["statics", "meyerhof1953", "practice"],
  limits: [
    "A rigid base with linear pressure; not for rock joints, slopes, machines, collapsible or expansive ground.",
    "Service loads at the column base; the value is net and on the same load basis.",
  ],
  inputs: footingCheckInput,
  outputs: footingCheckOutput,
  compute: checkFooting,
  lines: (input) => {
    const { common, combinations } = explainCheck(input, checkFooting(input));
    return [...common, ...combinations.flatMap(({ lines }) => lines)];
  },
});
