import { describe, expect, it } from "vitest";
import { missingFrom } from "@/scripts/check-paths.mjs";

const known = {
  exists: (path: string) => ["lib", "lib/env.ts", "tests", "tests/setup", "biome.json"].includes(path),
  commands: ["test", "audit:verify"],
};
const missing = (text: string) => missingFrom(text, known);

describe("paths that a document names", () => {
  it("are missed when they are not there, whether as code, as a link or in a block", () => {
    expect(missing("See `lib/gone.ts`.")).toEqual(["names lib/gone.ts, which does not exist"]);
    expect(missing("See [this](docs/gone.md#part).")).toEqual(["names docs/gone.md, which does not exist"]);
    expect(missing("```sh\nnode scripts/gone.mjs --all\n```")).toEqual([
      "names scripts/gone.mjs, which does not exist",
    ]);
    expect(missing("The folder `gone/`.")).toEqual(["names gone, which does not exist"]);
  });

  it("are left alone when they are there, or come only when the product runs", () => {
    expect(missing("`lib/env.ts`, `./lib/`, `biome.json`, `.local/env.json`, `.next/x.json`")).toEqual([]);
  });

  it("are looked at up to the first variable piece", () => {
    expect(missing("`tests/setup/<name>.test.ts` and `tests/*.ts`")).toEqual([]);
    expect(missing("`tests/gone/*.test.ts`")).toEqual(["names tests/gone/*.test.ts, which does not exist"]);
  });

  it("are not seen in addresses, routes, packages or either/or", () => {
    const text = "`https://a.example/b.ts` `/api/methods/x.json` `@/lib/x.ts` `and/or` `POST /a.ts`";
    expect(missing(text)).toEqual([]);
  });
});

describe("commands that a document names", () => {
  it("are missed when package.json has no such script", () => {
    expect(missing("Run `npm run audit:verify`, then `npm run -s gone`.")).toEqual([
      "names npm run gone, which package.json does not have",
    ]);
  });
});
