export function faultsOf(path: string, source: string, resolve?: (path: string) => string): string[];
export function checkImports(): string[];
