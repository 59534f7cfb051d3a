import { readdirSync, readFileSync } from "node:fs";

const root = `${import.meta.dirname}/../..`;
const METHOD = /^export (?:const|async function|function) (GET|HEAD|POST|PUT|PATCH|DELETE|OPTIONS)\b/gm;
const RENAMED = /\bas (GET|HEAD|POST|PUT|PATCH|DELETE|OPTIONS)\b/g;

export type RouteFile = { route: string; methods: string[] };

/** Every route file below app/ and the methods that it exports, read from the files themselves. */
export function routeFiles(): RouteFile[] {
  const files = (readdirSync(`${root}/app`, { recursive: true }) as string[]).filter((file) =>
    /(^|\/)route\.tsx?$/.test(file),
  );
  return files.sort().map((file) => {
    const text = readFileSync(`${root}/app/${file}`, "utf8");
    const methods = [...text.matchAll(METHOD), ...text.matchAll(RENAMED)].map(([, method]) => method ?? "");
    return {
      route: `/${file.replace(/\/?route\.tsx?$/, "")}`.replace(/\/\([^/]+\)/g, ""),
      methods: methods.sort(),
    };
  });
}
