import pg from "pg";
import { env } from "@/lib/env";

/** What a listener hears: one change by its id, or that some may have been missed and everything is to be read again. */
export type Heard = { changeId: string } | { reread: true };
type Listener = (heard: Heard) => void;

const RECONNECT_AFTER_MS = 1000;

/** One connection of this process that hears the database's changes and tells the open streams of each project. */
class LiveChanges {
  private readonly listeners = new Map<string, Set<Listener>>();
  private connection: pg.Client | undefined;
  private connecting = false;

  /** Hears the changes of one project until the function that it answers with is called. */
  listen(projectId: string, listener: Listener): () => void {
    const heard = this.listeners.get(projectId) ?? new Set();
    this.listeners.set(projectId, heard.add(listener));
    void this.connect(false);
    return () => {
      heard.delete(listener);
      if (heard.size === 0) this.listeners.delete(projectId);
      if (this.listeners.size === 0) void this.close();
    };
  }

  private async connect(again: boolean): Promise<void> {
    if (this.connection || this.connecting) return;
    this.connecting = true;
    const connection = new pg.Client({ connectionString: env().DATABASE_URL, connectionTimeoutMillis: 5000 });
    const lost = () => {
      if (this.connection !== connection) return;
      this.connection = undefined;
      this.later();
    };
    connection.on("error", lost);
    connection.on("end", lost);
    connection.on("notification", ({ payload }) => this.tell(payload ?? ""));
    try {
      await connection.connect();
      await connection.query("listen holdground_change");
      this.connection = connection;
      this.connecting = false;
      // A notification has no memory: what happened while nobody listened is read again.
      if (again)
        for (const project of this.listeners.values())
          for (const listener of project) listener({ reread: true });
      if (this.listeners.size === 0) await this.close();
    } catch {
      this.connecting = false;
      await connection.end().catch(() => {});
      this.later();
    }
  }

  private later(): void {
    if (this.listeners.size === 0) return;
    setTimeout(() => void this.connect(true), RECONNECT_AFTER_MS).unref();
  }

  private tell(payload: string): void {
    let named: { projectId?: unknown; changeId?: unknown };
    try {
      named = JSON.parse(payload);
    } catch {
      return;
    }
    if (typeof named.projectId !== "string" || typeof named.changeId !== "string") return;
    for (const listener of this.listeners.get(named.projectId) ?? []) listener({ changeId: named.changeId });
  }

  private async close(): Promise<void> {
    const { connection } = this;
    this.connection = undefined;
    await connection?.end().catch(() => {});
  }
}

const kept = globalThis as { holdgroundLive?: LiveChanges };

/** The process's one listener, kept across reloads. */
export function liveChanges(): LiveChanges {
  kept.holdgroundLive ??= new LiveChanges();
  return kept.holdgroundLive;
}
