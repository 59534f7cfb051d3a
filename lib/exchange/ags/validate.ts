import { checkAttachments } from "./attachment-rules";
import { cellReader, dictionaryOf } from "./dictionary";
import type { AgsEdition, AgsFile, AgsGroup, AgsReport, AgsSeverity } from "./file-model";
import { FindingList } from "./finding-list";
import { sortFindings } from "./group-builder";
import { checkKeys } from "./key-rules";
import { checkLinks } from "./link-rules";
import { checkLists } from "./list-rules";
import { checkNames } from "./naming-rules";
import type { RuleContext } from "./rule-context";
import { checkValues } from "./value-rules";

/** What a check may be told beside the file itself. */
export interface ValidateAgsOptions {
  /** Judge by this edition instead of the one the file states. */
  readonly edition?: AgsEdition;
  /** Paths `<FILE_FSET>/<FILE_NAME>` of the files delivered with the data; left out when it came alone. */
  readonly attached?: ReadonlySet<string>;
}

const readable = new Set(["ags4", "no-groups", "empty"]);

/**
 * Checks a read file against the numbered rules of the AGS 4 data format and gives the whole report, with the
 * findings of reading. A file that is no AGS 4 file has its one refusal and nothing else. Never throws.
 */
export function validateAgs(file: AgsFile, options: ValidateAgsOptions = {}): AgsReport {
  const edition = options.edition ?? file.edition;
  const findings = new FindingList();
  if (readable.has(file.kind)) {
    const context = contextOf(file, edition, findings);
    checkNames(context);
    checkValues(context);
    checkKeys(context);
    checkLinks(context);
    checkLists(context);
    checkAttachments(context, options.attached ?? null);
  }
  return {
    edition,
    statedEdition: file.statedEdition,
    stopped: file.stopped,
    findings: sortFindings([...file.findings, ...findings.list()]),
    counts: added(file.counts, findings.counts()),
    countsByRule: addedByRule(file.countsByRule, findings.countsByRule()),
  };
}

function contextOf(file: AgsFile, edition: AgsEdition, findings: FindingList): RuleContext {
  const groups = new Map<string, AgsGroup>();
  for (const group of file.groups) if (!groups.has(group.name)) groups.set(group.name, group);
  const tran = groups.get("TRAN");
  const row = tran?.rows[0];
  const stated = (heading: string, otherwise: string): string => {
    if (!tran || !row || !tran.headings.some(({ name }) => name === heading)) return otherwise;
    return cellReader(tran)(row.cells, heading);
  };
  return {
    file: { ...file, edition },
    groups,
    dictionary: dictionaryOf(file, edition),
    findings,
    delimiter: stated("TRAN_DLIM", "|") || "|",
    concatenator: stated("TRAN_RCON", "+"),
  };
}

function added(
  a: Readonly<Record<AgsSeverity, number>>,
  b: Readonly<Record<AgsSeverity, number>>,
): Record<AgsSeverity, number> {
  return { error: a.error + b.error, warning: a.warning + b.warning, note: a.note + b.note };
}

function addedByRule(
  a: Readonly<Record<string, number>>,
  b: Readonly<Record<string, number>>,
): Record<string, number> {
  const sums = new Map(Object.entries(a));
  for (const [rule, count] of Object.entries(b)) sums.set(rule, (sums.get(rule) ?? 0) + count);
  return Object.fromEntries(sums);
}
