import { answerOf, type Method, type MethodAnswer } from "@/lib/methods/define-method";
import { methods } from "@/lib/methods/index";
import { footingCheck } from "./method";

/** The published methods and the check that composes them: what the worksheet, the address and the command offer. */
export const allMethods: readonly Method<never, unknown>[] = [
  ...methods,
  footingCheck as unknown as Method<never, unknown>,
];

/** Runs one of them by its id; an id that is not there is an error like any other. */
export function runMethod(id: string, inputs: unknown): MethodAnswer {
  const method = allMethods.find((known) => known.id === id);
  if (!method)
    return {
      error: {
        code: "unknown-method",
        message: `There is no method ${JSON.stringify(id)}.`,
        fields: { method: `Known methods: ${allMethods.map((known) => known.id).join(", ")}.` },
      },
    };
  return answerOf(method, inputs);
}
