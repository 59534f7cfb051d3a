import { z } from "zod";

/** Text of at most so many characters without what no database keeps: the zero character and halves of a character. */
export const plainText = (limit: number) =>
  z
    .string("Text is expected here.")
    .max(limit, `At most ${limit} characters.`)
    .regex(/^[^\0\p{Surrogate}]*$/u, "There is a character in it that cannot be kept. Please type it again.");
