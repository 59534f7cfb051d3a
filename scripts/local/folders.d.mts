export const root: string;
export const local: string;
export const isRoot: boolean;
export function stateFolder(): string;
export function readLocal(name: string): Record<string, string> | undefined;
export function writeLocal(name: string, content: unknown): void;
export function secret(name: string): string;
