import { z } from "zod";
import type { ChangeId, ConsequenceId, FootingId, PersonId, ValueId } from "./ids";
import { plainText } from "./plain-text";

const uuid = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);

const changeId = uuid<ChangeId>();
const reason = plainText(4000)
  .trim()
  .min(10, "Say why in a sentence: it is kept for ever and read by others.");

export const outcomes = ["now fails", "still fails", "outside conditions", "recovers", "holds"] as const;
export type OutcomeName = (typeof outcomes)[number];

const pageOf = z.coerce.number().int().min(1).max(200).default(50);

export const listChangesInput = z.strictObject({
  state: z.enum(["open", "answered", "closed"]).optional(),
  valueId: uuid<ValueId>().optional(),
  /** The last change of the page before. */
  before: z.coerce.number().int().positive().optional(),
  limit: pageOf,
});
export const readChangeInput = z.strictObject({
  changeId,
  outcome: z.enum(outcomes).optional(),
  state: z.enum(["open", "answered"]).optional(),
  poured: z.enum(["yes", "no"]).optional(),
  search: plainText(100).optional(),
  /** As the page before gave it in `next`. */
  after: plainText(200).optional(),
  limit: pageOf,
});
export const acceptConsequencesInput = z.strictObject({
  changeId,
  consequenceIds: z.array(uuid<ConsequenceId>()).min(1, "Choose at least one footing.").max(500),
  reason,
});
export const referConsequencesInput = acceptConsequencesInput;
export const closeChangeInput = z.strictObject({ changeId, note: plainText(4000).trim().default("") });

export type ListChangesInput = z.input<typeof listChangesInput>;
export type ReadChangeInput = z.input<typeof readChangeInput>;
export type AnswerConsequencesInput = z.input<typeof acceptConsequencesInput>;
export type CloseChangeInput = z.input<typeof closeChangeInput>;

export type OutcomeCounts = Record<OutcomeName, number>;

export type ChangeItem = {
  id: ChangeId;
  seq: number;
  kind: string;
  title: string;
  reason: string;
  valueId: ValueId | null;
  madeBy: { id: PersonId; name: string };
  madeAt: string;
  counts: OutcomeCounts;
  total: number;
  answered: number;
  open: number;
  /** Poured footings among those still open. */
  openPoured: number;
  closed: { name: string; at: string; note: string } | null;
};
export type ChangeList = { items: ChangeItem[]; next: number | null };

export type AnswerKind = "re-checked" | "resized" | "accepted-as-built" | "referred-back";

export type ConsequenceItem = {
  id: ConsequenceId;
  footingId: FootingId;
  mark: string;
  gridReference: string;
  owner: { id: PersonId; name: string } | null;
  /** On site when the change was made, and now. */
  stageThen: string;
  stageNow: string;
  outcome: OutcomeName;
  verdictBefore: string | null;
  verdictAfter: string;
  utilisationBefore: number | null;
  utilisationAfter: number | null;
  requiredNet_kPa: number | null;
  open: boolean;
  answer: { kind: AnswerKind; reason: string; name: string; at: string; verdict: string | null } | null;
};
export type ChangeDetail = {
  change: ChangeItem;
  items: ConsequenceItem[];
  next: string | null;
  matching: number;
};

/** What a draft would do to the footings linked to its value. Nothing of it is written. */
export type RevisionPreview = {
  netAllowable_kPa: number | null;
  currentNet_kPa: number | null;
  /** How it was found: from the required values stored with each check, or by running every check again. */
  how: "stored required values" | "checks run again";
  linked: number;
  /** Linked footings that have no check yet: nothing can be said of them. */
  unchecked: number;
  counts: OutcomeCounts;
  /** Footings already excavated or poured among those that would fail or fall outside. */
  excavatedAffected: number;
  pouredAffected: number;
  /** The footing that is first to fail when the value is lowered from today's. */
  firstToFail: { footingId: FootingId; mark: string; requiredNet_kPa: number } | null;
  /** Number failing in bearing at each value, from the highest required value down. */
  curve: { netAllowable_kPa: number; failing: number }[];
  /** Those that would fail or fall outside, worst shortfall first. */
  worst: {
    footingId: FootingId;
    mark: string;
    stage: string;
    outcome: OutcomeName;
    requiredNet_kPa: number | null;
    shortfall_kPa: number | null;
  }[];
};
