import { env } from "@/lib/env";

const planted = new Map<string, () => void | Promise<void>>();

/** Tests only: does something when a named point is next reached. Refuses outside test runs. */
export function plantFault(point: string, act: () => void | Promise<void>): void {
  if (!env().HOLDGROUND_FAULTS) throw new Error("Fault points are closed outside test runs.");
  planted.set(point, act);
}

/** A named step of a big transaction, where a test may crash, wait or interleave. Costs nothing otherwise. */
export async function faultPoint(point: string): Promise<void> {
  const faults = env().HOLDGROUND_FAULTS;
  if (!faults) return;
  // From outside the process: HOLDGROUND_FAULTS="kill@issue:consequences" ends it there as a power cut would.
  if (faults === `kill@${point}`) process.kill(process.pid, "SIGKILL");
  const act = planted.get(point);
  if (act) {
    planted.delete(point);
    await act();
  }
}
