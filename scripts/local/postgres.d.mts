import type { Client } from "pg";

export function onServer<Result>(url: string, act: (client: Client) => Promise<Result>): Promise<Result>;
