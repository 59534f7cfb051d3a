export function ensureServices(
  use: "demo" | "test",
  options?: { given?: Record<string, string | undefined>; origin?: string },
): Promise<{ env: ServiceEnvironment; started: string[] }>;

export type ServiceEnvironment = Record<
  | "DATABASE_URL"
  | "DATABASE_OWNER_URL"
  | "DATABASE_ADMIN_URL"
  | "S3_ENDPOINT"
  | "S3_REGION"
  | "S3_ACCESS_KEY"
  | "S3_SECRET_KEY"
  | "S3_BUCKET"
  | "SMTP_URL"
  | "MAIL_FROM"
  | "NEXTAUTH_SECRET",
  string
> & { MAIL_SINK_URL?: string };
