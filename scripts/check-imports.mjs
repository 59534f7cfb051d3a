import { existsSync, readdirSync, readFileSync } from "node:fs";
import { builtinModules } from "node:module";
import { dirname, join, normalize, relative } from "node:path";
import { parseSync } from "vite";
import { root } from "./local/folders.mjs";

/*
 * The direction of imports, held over relative paths and import() too, which Biome's patterns do not follow; and what
 * no import tells: clocks and chance in pure folders, and strings that Leaflet or the browser would read as HTML.
 */

const pure = [
  "lib/methods",
  "lib/check",
  "lib/geometry",
  "lib/exchange",
  "lib/contracts",
  "lib/units",
  "lib/access",
];
const seen = [...pure, "lib/client"];

/** What each part may import of the others. The first part that a file lies in holds. */
const parts = [
  { part: "app/api", may: ["app/api", "lib/http", "lib/services", "lib/reports", ...pure] },
  { part: "app", may: ["app", "components", "lib/http", "lib/services", ...seen] },
  { part: "components/plan", may: ["components", ...seen], leaflet: true },
  { part: "components", may: ["components", ...seen] },
  { part: "lib/client", may: seen },
  { part: "lib/methods", may: ["lib/methods"], pure: true },
  { part: "lib/geometry", may: ["lib/geometry"], pure: true },
  { part: "lib/units", may: ["lib/units"], pure: true },
  { part: "lib/check", may: ["lib/check", "lib/methods", "lib/geometry", "lib/units"], pure: true },
  { part: "lib/contracts", may: pure.filter((name) => name !== "lib/exchange"), pure: true },
  { part: "lib/exchange", may: pure, pure: true },
  { part: "lib/access", may: ["lib/access", "lib/contracts"], pure: true },
  { part: "lib/reports", may: ["lib/reports", ...pure] },
  { part: "lib/storage", may: ["lib/storage", "lib/env.ts", "lib/services/errors.ts", ...pure] },
  { part: "lib/mail", may: ["lib/mail", "lib/services", "lib/env.ts", "db", ...pure] },
  {
    part: "lib/services",
    may: ["lib/services", "lib/storage", "lib/mail", "lib/reports", "lib/env.ts", "db", ...pure],
  },
  {
    part: "lib/http",
    may: ["lib/http", "lib/services", "lib/mail", "lib/storage", "lib/env.ts", "db", ...pure],
  },
  { part: "lib/env.ts", may: [] },
  { part: "db/seed", may: ["db", "lib"] },
  { part: "db", may: ["db", "lib/env.ts", ...pure] },
  { part: "scripts", may: ["scripts", "lib", "db", "tests/bench"] },
];

/** Libraries that act on the world: none of them belongs into a pure folder. */
const acting =
  /^(pg|pg-.*|drizzle-orm|next|next-auth|react|react-dom|nodemailer|minio|@aws-sdk|@node-rs|pdfkit)(\/|$)/;
const leaflet = /^(leaflet|react-leaflet|@geoman-io)(\/|$)/;
const within = (path, part) => path === part || path.startsWith(`${part}/`);

/** Every fault of one file, as sentences. `path` is relative to the repository; `resolve` finds what a path names. */
export function faultsOf(path, source, resolve = resolveInRepository) {
  const rule = parts.find(({ part }) => within(path, part));
  const parsed = parseSync(path, source);
  if (parsed.errors.length > 0) return [`${path} cannot be read: ${parsed.errors[0].message}`];
  const faults = [];
  for (const name of importsOf(parsed, source)) {
    const target = name.startsWith("@/")
      ? name.slice(2)
      : /^\.\.?(\/|$)/.test(name)
        ? join(dirname(path), name)
        : undefined;
    if (target === undefined) faults.push(...libraryFaults(path, rule, name));
    else if (rule) {
      const found = resolve(normalize(target));
      if (!rule.may.some((allowed) => within(found, allowed)))
        faults.push(`${path} imports ${found}: ${rule.part} may import ${rule.may.join(", ") || "nothing"}.`);
    }
  }
  walk(parsed.program, (node) =>
    faults.push(...htmlFaults(path, node), ...(rule?.pure ? chanceFaults(path, node) : [])),
  );
  return faults;
}

function importsOf({ module, program }, source) {
  const names = [...module.staticImports.map(({ moduleRequest }) => moduleRequest.value)];
  for (const { entries } of module.staticExports)
    for (const { moduleRequest } of entries) if (moduleRequest) names.push(moduleRequest.value);
  for (const { moduleRequest } of module.dynamicImports)
    names.push(source.slice(moduleRequest.start, moduleRequest.end).replace(/^["'`]|["'`]$/g, ""));
  walk(program, (node) => {
    if (
      node.type === "CallExpression" &&
      node.callee.name === "require" &&
      node.arguments[0]?.type === "Literal"
    )
      names.push(String(node.arguments[0].value));
    if (node.type === "TSImportType" && node.source?.value) names.push(node.source.value);
  });
  return new Set(names);
}

function libraryFaults(path, rule, name) {
  if (leaflet.test(name) && !rule?.leaflet && !within(path, "tests"))
    return [`${path} imports ${name}: Leaflet is imported in components/plan alone.`];
  const isNode = name.startsWith("node:") || builtinModules.includes(name);
  if (rule?.pure && (isNode || acting.test(name)))
    return [`${path} imports ${name}: ${rule.part} is pure, it computes and touches nothing.`];
  if (isNode && (within(path, "components") || within(path, "lib/client")))
    return [`${path} imports ${name}: it runs in the browser, where there is no Node.`];
  return [];
}

/** Calls that give another answer each time they are made. */
function chanceFaults(path, node) {
  const said = (what) => [
    `${path} uses ${what}: a pure folder knows no clock and no chance; take it as an argument.`,
  ];
  if (node.type === "NewExpression" && node.callee.name === "Date" && node.arguments.length === 0)
    return said("new Date()");
  if (node.type !== "CallExpression" || node.callee.type !== "MemberExpression") return [];
  const called = `${node.callee.object.name}.${node.callee.property.name}`;
  return /^(Date\.now|Math\.random|performance\.now|crypto\.(randomUUID|getRandomValues))$/.test(called)
    ? said(called)
    : [];
}

const popups = /^(bindPopup|bindTooltip|setPopupContent|setTooltipContent|openPopup|openTooltip|setContent)$/;
const sinks = /^(innerHTML|outerHTML|srcdoc)$/;

/** Leaflet takes a string for HTML, and so does the browser in these places: text from a register must not get there. */
function htmlFaults(path, node) {
  const called =
    node.type === "CallExpression" && node.callee.type === "MemberExpression"
      ? node.callee.property.name
      : "";
  if (popups.test(called) && node.arguments.length > 0 && !isNode(node.arguments[0]))
    return [
      `${path} calls ${called} with what may be a string: Leaflet reads that as HTML, so give it a DOM node (document.createTextNode, or a value whose name ends with Node or Element).`,
    ];
  if (called === "insertAdjacentHTML" || (called === "write" && node.callee.object.name === "document"))
    return [`${path} calls ${called}: build elements and set their textContent.`];
  if (node.type === "AssignmentExpression" && sinks.test(node.left.property?.name ?? ""))
    return [`${path} sets ${node.left.property.name}: build elements and set their textContent.`];
  if (called === "divIcon" && iconHtml(node.arguments[0]))
    return [`${path} gives divIcon HTML that is put together: give it an element, or a fixed string.`];
  return [];
}

function isNode(given) {
  if (given.type === "CallExpression") {
    const name = given.callee.name ?? given.callee.property?.name ?? "";
    return /(Node|Element)$/.test(name);
  }
  if (given.type === "Identifier") return /(^node|^element|Node|Element)$/.test(given.name);
  // openPopup(latlng) takes a place.
  return given.type === "ArrayExpression" || given.type === "ObjectExpression";
}

function iconHtml(options) {
  const html = options?.properties?.find((property) => property.key?.name === "html")?.value;
  if (!html) return false;
  const fixed = html.type === "Literal" || (html.type === "TemplateLiteral" && html.expressions.length === 0);
  return !fixed && !isNode(html);
}

function walk(node, visit) {
  if (Array.isArray(node)) for (const one of node) walk(one, visit);
  else if (node && typeof node === "object") {
    if (typeof node.type === "string") visit(node);
    for (const [key, value] of Object.entries(node))
      if (key !== "parent" && typeof value === "object") walk(value, visit);
  }
}

function resolveInRepository(path) {
  for (const ending of ["", ".ts", ".tsx", ".mjs", ".d.ts", "/index.ts", "/index.tsx"])
    if (existsSync(join(root, path + ending)) && (ending || /\.\w+$/.test(path))) return path + ending;
  return path;
}

/** Every fault in the checkout's sources. */
export function checkImports() {
  const paths = ["app", "components", "lib", "db", "scripts"].flatMap(sourcesBelow);
  return paths.flatMap((path) => faultsOf(path, readFileSync(join(root, path), "utf8")));
}

function sourcesBelow(folder) {
  if (!existsSync(join(root, folder))) return [];
  return readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|mjs)$/.test(entry.name) && !entry.name.endsWith(".d.mts"))
    .map((entry) => relative(root, join(entry.parentPath, entry.name)))
    .sort();
}

if (process.argv[1] === import.meta.filename) {
  const faults = checkImports();
  for (const fault of faults) console.error(fault);
  if (faults.length === 0) console.log("Imports run one way; no string becomes HTML.");
  process.exitCode = faults.length > 0 ? 1 : 0;
}
