/** Ids are uuids branded by what they name, so that a zone's id cannot stand where a footing's is meant. */
type Id<Brand extends string> = string & { readonly [brand]: Brand };
declare const brand: unique symbol;

export type PersonId = Id<"person">;
export type ProjectId = Id<"project">;
export type DocumentId = Id<"document">;
export type DocumentRevisionId = Id<"document revision">;
export type UploadId = Id<"upload">;
export type HoleId = Id<"hole">;
export type HoleRevisionId = Id<"hole revision">;
export type StratumId = Id<"stratum">;
export type GroundUnitId = Id<"ground unit">;
export type ZoneId = Id<"zone">;
export type ZoneRevisionId = Id<"zone revision">;
export type ValueId = Id<"bearing value">;
export type ValueRevisionId = Id<"bearing value revision">;
export type FootingId = Id<"footing">;
export type FootingRevisionId = Id<"footing revision">;
export type LoadSetId = Id<"load set">;
export type CheckId = Id<"check">;
export type ChangeId = Id<"change">;
export type ConsequenceId = Id<"consequence">;
export type InspectionId = Id<"inspection">;
