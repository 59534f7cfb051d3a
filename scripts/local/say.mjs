/**
 * Does one step and tells what it was and how long it took; `describe` turns its outcome into a few words. Answers with
 * the outcome.
 */
export async function step(title, act, describe = (outcome) => (typeof outcome === "string" ? outcome : "")) {
  const begun = Date.now();
  try {
    const outcome = await act();
    const words = describe(outcome);
    console.log(`  ${seconds(begun)}  ${title}${words ? `: ${words}` : ""}`);
    return outcome;
  } catch (error) {
    console.log(`  ${seconds(begun)}  ${title}: failed`);
    throw error;
  }
}

const seconds = (begun) => `${((Date.now() - begun) / 1000).toFixed(1).padStart(6)} s`;

/** Ends the program with one clear sentence; where it came from only when asked for (HOLDGROUND_DEBUG=1). */
export function giveUp(error) {
  console.error(`\n${error instanceof Error ? error.message : error}`);
  if (process.env.HOLDGROUND_DEBUG && error instanceof Error) console.error(error.stack);
  process.exit(1);
}
