export function missingFrom(
  text: string,
  known: { exists: (path: string) => boolean; commands: string[] },
): string[];
export function checkDocuments(): string[];
