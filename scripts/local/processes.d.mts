type Facts = Record<string, unknown>;
export type ProcessRecord = Facts & { pid: number; ticks: string };

export function startTicks(pid: number): string | undefined;
export function running(name: string): ProcessRecord | undefined;
export function note(name: string, pid: number, facts?: Facts): void;
export function forget(name: string): void;
export function end(
  name: string,
  options?: { signal?: NodeJS.Signals; patience_ms?: number },
): Promise<boolean>;
export function freePort(from: number, count?: number): Promise<number>;
export function pause(time_ms: number): Promise<void>;
