export function sourcesHash(): string;
export function builtFrom(): string | undefined;
