import type { InputError, MethodAnswer, RegisteredMethod } from "@/lib/methods/define-method";
import { methods } from "@/lib/methods/index";
import { angularDistortion } from "./angular-distortion";
import { footingCheck } from "./method";

/** The published methods and the check that composes them: what the worksheet, the address and the command offer. */
export const allMethods: readonly RegisteredMethod[] = [...methods, angularDistortion, footingCheck];

export type UnknownMethod = { code: "unknown-method"; message: string; fields: Record<string, string> };
export type RunAnswer = MethodAnswer | { error: InputError | UnknownMethod };

/** Runs one of them by its id; an id that is not there is an error like any other. */
export function runMethod(id: string, inputs: unknown): RunAnswer {
  const method = allMethods.find((known) => known.id === id);
  if (method) return method.answer(inputs);
  return {
    error: {
      code: "unknown-method",
      message: `There is no method ${JSON.stringify(id)}.`,
      fields: { method: `Known methods: ${allMethods.map((known) => known.id).join(", ")}.` },
    },
  };
}
