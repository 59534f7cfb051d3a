import { execFileSync, spawnSync } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { parseEnv } from "node:util";
import { describe, expect, it } from "vitest";
import { variables } from "@/lib/env";

const at = (path: string) => `${import.meta.dirname}/../../${path}`;
const text = (path: string) => readFileSync(at(path), "utf8");

type Service = {
  build?: { context: string; dockerfile: string; target: string };
  image?: string;
  command?: string[];
  environment: Record<string, string>;
  volumes?: string[];
  ports?: string[];
  depends_on?: Record<string, { condition: string }>;
};
type Compose = { services: Record<string, Service>; volumes: Record<string, unknown> };

/** Read by a YAML reader of another make: Debian's python3-yaml, which comes with python3-swift. */
function readYaml(path: string): Compose {
  const script = "import json, sys, yaml; json.dump(yaml.safe_load(sys.stdin), sys.stdout)";
  return JSON.parse(
    execFileSync("/usr/bin/python3", ["-c", script], { input: text(path), encoding: "utf8" }),
  );
}

const compose = readYaml("docker/compose.yaml");
const dockerfile = text("docker/Dockerfile");
const service = (name: string): Service => {
  const found = compose.services[name];
  if (!found) throw new Error(`There is no service ${name} in compose.yaml.`);
  return found;
};

/** What a deployment must be told: all that the application reads, but for what opens fault points in tests. */
const wanted = Object.keys(variables).filter((name) => name !== "HOLDGROUND_FAULTS");

describe("the settings of a deployment", () => {
  it("gives the application each variable it reads, and none that it does not", () => {
    expect(Object.keys(service("app").environment).sort()).toEqual([...wanted].sort());
  });

  it("keeps the owner's password from the application", () => {
    expect(JSON.stringify(service("app").environment)).not.toMatch(/OWNER|SUPERUSER/);
  });

  it("names every variable in .env.example, and takes from there every one that compose asks for", () => {
    const example = Object.keys(parseEnv(text(".env.example")));
    const onlyHere = [
      "DATABASE_OWNER_URL",
      "DATABASE_SUPERUSER_PASSWORD",
      "DATABASE_OWNER_PASSWORD",
      "DATABASE_APP_PASSWORD",
    ];
    expect([...example].sort()).toEqual([...wanted, ...onlyHere, "PORT", "HOLDGROUND_DEMO"].sort());
    const asked = [...text("docker/compose.yaml").matchAll(/\$\{(\w+)/g)].map(([, name]) => name);
    expect(asked.filter((name = "") => !example.includes(name))).toEqual([]);
  });

  it("holds no password: .env.example leaves every secret empty", () => {
    for (const [name, value] of Object.entries(parseEnv(text(".env.example"))))
      if (/PASSWORD|SECRET|KEY|_URL$/.test(name)) expect(value, name).toBe("");
  });

  it("refuses to start without a secret that has no sensible default", () => {
    const yaml = text("docker/compose.yaml");
    for (const name of [
      "NEXTAUTH_SECRET",
      "S3_SECRET_KEY",
      "DATABASE_APP_PASSWORD",
      "DATABASE_OWNER_PASSWORD",
    ])
      expect(yaml, name).toContain(`\${${name}:?`);
  });
});

describe("compose.yaml and Dockerfile", () => {
  it("name files and stages that exist", () => {
    const stages = [...dockerfile.matchAll(/^FROM \S+ AS (\w+)$/gm)].map(([, stage]) => stage);
    for (const [name, { build, command, volumes = [] }] of Object.entries(compose.services)) {
      if (build) {
        expect(existsSync(at(`docker/${build.context}/${build.dockerfile}`)), name).toBe(true);
        expect(stages, name).toContain(build.target);
      }
      if (command?.[0] === "node") expect(existsSync(at(String(command[1]))), name).toBe(true);
      for (const [from = ""] of volumes.map((volume) => volume.split(":")))
        if (from.startsWith("./")) expect(existsSync(at(`docker/${from}`)), from).toBe(true);
        else expect(Object.keys(compose.volumes), name).toContain(from);
    }
  });

  it("copy only what is in the repository or in an earlier stage", () => {
    const copies = [...dockerfile.matchAll(/^COPY (?!--from)(.+) \S+$/gm)].flatMap(([, from = ""]) =>
      from.split(" "),
    );
    expect(copies.length).toBeGreaterThan(3);
    const built = /^(\.next|node_modules)$/;
    const carried = [...dockerfile.matchAll(/^COPY --from=\w+ \/register\/(\S+)/gm)].map(
      ([, path = ""]) => path,
    );
    for (const path of carried) expect(built.test(path) || existsSync(at(path)), path).toBe(true);
    for (const path of copies) expect(existsSync(at(path)), path).toBe(true);
  });

  it("pin every image to more than a name, and serve as an ordinary account", () => {
    const images = Object.values(compose.services).flatMap(({ image }) => image ?? []);
    const bases = [...dockerfile.matchAll(/^FROM (\S+)/gm)].map(([, base]) => base);
    for (const image of [...images, ...bases]) expect(image).toMatch(/:(?!latest$).*\d/);
    expect(dockerfile.slice(dockerfile.indexOf("AS serve"))).toMatch(/^USER node$/m);
  });

  it("publish ports on loopback alone, where a proxy with TLS stands in front", () => {
    const ports = Object.values(compose.services).flatMap(({ ports = [] }) => ports);
    expect(ports.length).toBeGreaterThan(0);
    for (const port of ports) expect(port).toMatch(/^127\.0\.0\.1:/);
  });

  it("start the application only when migrations and bucket are done", () => {
    expect(service("app").depends_on).toEqual({ prepare: { condition: "service_completed_successfully" } });
    expect(Object.keys(service("prepare").depends_on ?? {}).sort()).toEqual(["database", "store"]);
  });

  it("has shell scripts that the shell can read", () => {
    for (const script of ["docker/make-roles.sh", ".ci/run"])
      expect(spawnSync("bash", ["-n", at(script)], { encoding: "utf8" }).stderr, script).toBe("");
  });

  it("leaves secrets and local data out of the image", () => {
    const ignored = text(".dockerignore").trim().split("\n");
    for (const path of [".env", ".local", ".git", "node_modules"]) expect(ignored).toContain(path);
  });
});
