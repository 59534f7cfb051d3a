type DatabaseEnvironment = { DATABASE_URL: string; DATABASE_OWNER_URL: string; DATABASE_ADMIN_URL: string };

export function runName(): string;
export function makeDatabase(adminUrl: string, name: string, ownerUrl: string): Promise<void>;
export function copyDatabase(adminUrl: string, template: string, ownerUrl: string): Promise<string>;
export function dropDatabase(adminUrl: string, name: string): Promise<void>;
export function dropDatabases(adminUrl: string, run: string): Promise<void>;
export function clearLeftovers(adminUrl: string): Promise<void>;
export function databaseUrls(
  environment: DatabaseEnvironment,
  name: string,
): { appUrl: string; ownerUrl: string; superuserUrl: string };
