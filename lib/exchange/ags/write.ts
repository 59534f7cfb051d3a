import { codeLabel, typeLabel, unitLabel } from "./code-labels";
import { standardDictionary } from "./dictionary";
import type { AgsEdition, AgsHeading } from "./file-model";
import { FindingList } from "./finding-list";
import { plainText } from "./plain-text";
import { readAgs } from "./read";
import { validateAgs } from "./validate";
import {
  type Column,
  fileColumns,
  holeColumns,
  installationColumns,
  readingColumns,
  riseColumns,
  sampleColumns,
  sptColumns,
  stratumColumns,
  strikeColumns,
} from "./write-columns";
import type { AgsExport, AgsWriting, WrittenUserGroup } from "./write-model";
import { formatSheets, renderGroups, type Sheet, type WrittenGroup } from "./write-sheet";

const edition: AgsEdition = "4.1.1";
const delimiter = "|";
const concatenator = "+";

/**
 * Writes an AGS 4 file (edition 4.1.1): quotes doubled, CR LF, ASCII unless Latin-1 letters are asked for, with the
 * UNIT, TYPE, ABBR and DICT groups that its contents need. The file is read back and its report handed along: one
 * with an error, for instance a key that stands twice, must not be given out.
 */
export function writeAgs(given: AgsExport): AgsWriting {
  const findings = new FindingList();
  const characters = given.characters ?? "ascii";
  const body = formatSheets(bodySheets(given), characters, findings);
  const dict = formatSheets(declarationSheet(given.userGroups ?? []), characters, findings);
  const head = formatSheets([projectSheet(given), transmittalSheet(given)], characters, findings);
  const groups = withLists([...head, ...dict, ...body], given);
  const text = renderGroups(groups);
  const bytes = new TextEncoder().encode(text);
  const attached = new Set((given.files ?? []).map(({ set, name }) => `${set.trim()}/${name.trim()}`));
  const report = validateAgs(readAgs(bytes), { attached });
  return { bytes, text, findings: findings.list(), report };
}

function sheetOf<Row>(
  name: string,
  columns: readonly Column<Row>[],
  rows: readonly Row[] | undefined,
): Sheet[] {
  if (!rows || rows.length === 0) return [];
  const facts = new Map(
    standardDictionary(edition)
      .get(name)
      ?.headings.map((heading) => [heading.name, heading]),
  );
  const headings = columns.map(([heading]): AgsHeading => {
    const { type = "X", unit = "" } = facts.get(heading) ?? {};
    return { name: heading, type, unit };
  });
  return [{ name, headings, rows: rows.map((row) => columns.map(([, item]) => item(row))) }];
}

function projectSheet({ project }: AgsExport): Sheet {
  const { projectId, name, location, client, contractor, engineer, memo } = project;
  const items = [projectId, name, location, client, contractor, engineer, memo];
  const names = ["PROJ_ID", "PROJ_NAME", "PROJ_LOC", "PROJ_CLNT", "PROJ_CONT", "PROJ_ENG", "PROJ_MEMO"];
  return {
    name: "PROJ",
    headings: names.map((heading) => ({ name: heading, type: heading === "PROJ_ID" ? "ID" : "X", unit: "" })),
    rows: [items],
  };
}

function transmittalSheet({ transmittal }: AgsExport): Sheet {
  const { issueNumber, date, producer, status, description, recipient, remarks } = transmittal;
  const row: readonly (readonly [string, string | undefined])[] = [
    ["TRAN_ISNO", issueNumber],
    ["TRAN_DATE", date],
    ["TRAN_PROD", producer],
    ["TRAN_STAT", status],
    ["TRAN_DESC", description],
    ["TRAN_AGS", edition],
    ["TRAN_RECV", recipient],
    ["TRAN_DLIM", delimiter],
    ["TRAN_RCON", concatenator],
    ["TRAN_REM", remarks],
  ];
  const headings = row.map(([name]) => {
    const isDate = name === "TRAN_DATE";
    return { name, type: isDate ? "DT" : "X", unit: isDate ? "yyyy-mm-dd" : "" };
  });
  return { name: "TRAN", headings, rows: [row.map(([, item]) => item)] };
}

function bodySheets(given: AgsExport): Sheet[] {
  const rises = (given.strikes ?? []).flatMap(({ hole, depth_m, rises: own = [] }) =>
    own.map((rise) => ({ ...rise, hole, strikeDepth_m: depth_m })),
  );
  return [
    ...sheetOf("FILE", fileColumns, given.files),
    ...sheetOf("LOCA", holeColumns, given.holes),
    ...sheetOf("GEOL", stratumColumns, given.strata),
    ...sheetOf("ISPT", sptColumns, given.spts),
    ...sheetOf("WSTG", strikeColumns, given.strikes),
    ...sheetOf("WSTD", riseColumns, rises),
    ...sheetOf("SAMP", sampleColumns, given.samples),
    ...sheetOf("MONG", installationColumns, given.installations),
    ...sheetOf("MOND", readingColumns, given.readings),
    ...(given.userGroups ?? []).filter(({ rows }) => rows.length > 0).map(inPlainUnits),
  ];
}

function inPlainUnits({ name, headings, rows }: WrittenUserGroup): Sheet {
  return {
    name,
    headings: headings.map((heading) => ({ ...heading, unit: plainText(heading.unit).text })),
    rows,
  };
}

function declarationSheet(userGroups: readonly WrittenUserGroup[]): Sheet[] {
  const rows = userGroups.flatMap((group) => [
    ["GROUP", group.name, "", "", "", group.description, "", group.parent === "" ? "-" : group.parent],
    ...group.headings.map(({ name, type, unit, description, key, required }) => {
      const status = [key ? "KEY" : "", required ? "REQUIRED" : ""].filter((word) => word !== "").join("+");
      return ["HEADING", group.name, name, status || "OTHER", type, description, unit, ""];
    }),
  ]);
  if (rows.length === 0) return [];
  const names = [
    "DICT_TYPE",
    "DICT_GRP",
    "DICT_HDNG",
    "DICT_STAT",
    "DICT_DTYP",
    "DICT_DESC",
    "DICT_UNIT",
    "DICT_PGRP",
  ];
  const types = ["PA", "X", "X", "PA", "PT", "X", "PU", "X"];
  const headings = names.map((name, place) => ({ name, type: types[place] ?? "X", unit: "" }));
  return [{ name: "DICT", headings, rows }];
}

/** Adds the lists of what is used: codes in ABBR, types in TYPE, units in UNIT, each behind the transmittal. */
function withLists(groups: readonly WrittenGroup[], given: AgsExport): WrittenGroup[] {
  const codes = usedCodes(groups, given);
  const text = (name: string): AgsHeading => ({ name, type: "X", unit: "" });
  const abbreviations: WrittenGroup = {
    name: "ABBR",
    headings: ["ABBR_HDNG", "ABBR_CODE", "ABBR_DESC"].map(text),
    rows: codes,
  };
  const listed = codes.length > 0 ? [abbreviations] : [];
  const all = [...groups, ...listed];
  const units = new Set(all.flatMap(({ headings }) => headings.map(({ unit }) => unit)));
  const types = new Set(["X", ...all.flatMap(({ headings }) => headings.map(({ type }) => type))]);
  for (const { headings, rows } of groups) {
    for (const [column, { type }] of headings.entries()) {
      const into = type === "PU" ? units : type === "PT" ? types : null;
      if (into) for (const items of rows) into.add(items[column] ?? "");
    }
  }
  for (const list of [units, types]) list.delete("");
  const typeGroup: WrittenGroup = {
    name: "TYPE",
    headings: ["TYPE_TYPE", "TYPE_DESC"].map(text),
    rows: [...types].sort().map((type) => [type, typeLabel(type)]),
  };
  // A file without a single unit still has the group: metres are what the format measures in.
  const unitGroup: WrittenGroup = {
    name: "UNIT",
    headings: ["UNIT_UNIT", "UNIT_DESC"].map(text),
    rows: [...units.add("m")].sort().map((unit) => [unit, unitLabel(unit)]),
  };
  return [...groups.slice(0, 2), typeGroup, unitGroup, ...listed, ...groups.slice(2)];
}

function usedCodes(groups: readonly WrittenGroup[], given: AgsExport): string[][] {
  const told = new Map<string, string>();
  for (const { heading, code, description } of given.abbreviations ?? []) {
    const { text } = plainText(description, given.characters);
    if (text.trim() !== "") told.set(`${heading}\u0001${plainText(code, given.characters).text}`, text);
  }
  const used = new Map<string, string[]>();
  for (const { headings, rows } of groups) {
    for (const [column, { name, type }] of headings.entries()) {
      if (type !== "PA") continue;
      for (const items of rows) {
        for (const part of (items[column] ?? "").split(concatenator)) {
          const code = part.trim();
          const key = `${name}\u0001${code}`;
          if (code !== "" && !used.has(key))
            used.set(key, [name, code, told.get(key) ?? codeLabel(name, code)]);
        }
      }
    }
  }
  return [...used.values()].sort((a, b) => (a.join("\u0001") < b.join("\u0001") ? -1 : 1));
}
