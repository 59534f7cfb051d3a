export function checkNode(): void;
export function modulesMatchLock(folder?: string): boolean;
export function run(command: string[], input?: string, options?: Record<string, unknown>): Promise<string>;
