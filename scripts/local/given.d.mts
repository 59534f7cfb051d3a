export function givenEnvironment(): Record<string, string>;
