import type { AgsFinding, AgsSeverity } from "./file-model";

/** How many findings of one rule are listed one by one; a file that breaks a rule on every line stays readable. */
export const listedPerRule = 1000;

/** Where a finding stands; left out means "the file as a whole". */
export interface Place {
  readonly line?: number | null;
  readonly group?: string | null;
  readonly heading?: string | null;
}

/** Gathers findings, counts all of them and lists a bounded number per rule, so that memory stays bounded too. */
export class FindingList {
  private readonly listed: AgsFinding[] = [];
  private readonly totals = new Map<string, { count: number; severity: AgsSeverity }>();
  private readonly bySeverity: Record<AgsSeverity, number> = { error: 0, warning: 0, note: 0 };

  /** Adds one finding. */
  add(rule: string, severity: AgsSeverity, place: Place, message: string): void {
    const total = this.totals.get(rule);
    if (total) total.count += 1;
    else this.totals.set(rule, { count: 1, severity });
    this.bySeverity[severity] += 1;
    if ((total?.count ?? 1) > listedPerRule) return;
    const { line = null, group = null, heading = null } = place;
    this.listed.push({ rule, line, group, heading, severity, message });
  }

  /** The listed findings, with one closing sentence for each rule whose list was cut short. */
  list(): AgsFinding[] {
    const closing: AgsFinding[] = [];
    for (const [rule, { count, severity }] of this.totals) {
      if (count <= listedPerRule) continue;
      const message = `${count - listedPerRule} more findings under rule ${rule} are counted but not listed.`;
      closing.push({ rule, line: null, group: null, heading: null, severity, message });
    }
    return [...this.listed, ...closing];
  }

  /** Findings per rule, listed or not. */
  countsByRule(): Record<string, number> {
    return Object.fromEntries([...this.totals].map(([rule, { count }]) => [rule, count]));
  }

  /** Findings per severity, listed or not. */
  counts(): Record<AgsSeverity, number> {
    return { ...this.bySeverity };
  }
}
