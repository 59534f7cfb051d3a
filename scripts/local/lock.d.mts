export function oneAtATime<Result>(
  name: string,
  act: () => Promise<Result>,
  options?: { patience_ms?: number },
): Promise<Result>;
