/** Does one step and tells what it is and how long it took. `act` may return a few words about the outcome. */
export async function step(title, act) {
  const begun = Date.now();
  try {
    const outcome = await act();
    const note = typeof outcome === "string" && outcome ? `: ${outcome}` : "";
    console.log(`  ${seconds(begun)}  ${title}${note}`);
    return outcome;
  } catch (error) {
    console.log(`  ${seconds(begun)}  ${title}: failed`);
    throw error;
  }
}

const seconds = (begun) => `${((Date.now() - begun) / 1000).toFixed(1).padStart(6)} s`;

/** Ends the program with one clear sentence; details only when asked for (HOLDGROUND_DEBUG=1). */
export function giveUp(error) {
  console.error(`\n${error instanceof Error ? error.message : error}`);
  if (process.env.HOLDGROUND_DEBUG && error instanceof Error) console.error(error.stack);
  process.exit(1);
}
