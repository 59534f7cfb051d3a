/** Runs once when the server starts, before its first request. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs" || process.env.NEXT_PHASE === "phase-production-build") return;
  const { startServer } = await import("@/lib/http/start-server");
  startServer();
}
