/** A filter as it stands in the address or in a request. */
type Filter = Readonly<Record<string, unknown>>;

/** What is kept of a project, by subject. A key is `["project", id, subject, …]`, so each level can be read again whole. */
const subject =
  (name: string) =>
  (projectId: string, ...rest: readonly unknown[]) =>
    ["project", projectId, name, ...rest] as const;

/** Names under which the browser keeps what it has read. */
export const keys = {
  /** All of one project: what is read again when the project changes. */
  project: (projectId: string) => ["project", projectId] as const,
  documents: (projectId: string, filter: Filter = {}) => subject("documents")(projectId, filter),
  document: (projectId: string, documentId: string) => subject("document")(projectId, documentId),
  holes: (projectId: string, filter: Filter = {}) => subject("holes")(projectId, filter),
  hole: (projectId: string, holeId: string) => subject("hole")(projectId, holeId),
  units: (projectId: string) => subject("units")(projectId),
  zones: (projectId: string) => subject("zones")(projectId),
  plan: (projectId: string, ...rest: readonly unknown[]) => subject("plan")(projectId, ...rest),
  section: (projectId: string, ...rest: readonly unknown[]) => subject("section")(projectId, ...rest),
  values: (projectId: string, filter: Filter = {}) => subject("values")(projectId, filter),
  value: (projectId: string, valueId: string, ...rest: readonly unknown[]) =>
    subject("value")(projectId, valueId, ...rest),
  footings: (projectId: string, filter: Filter = {}) => subject("footings")(projectId, filter),
  footing: (projectId: string, footingId: string, ...rest: readonly unknown[]) =>
    subject("footing")(projectId, footingId, ...rest),
  check: (projectId: string, checkId: string) => subject("check")(projectId, checkId),
  changes: (projectId: string, filter: Filter = {}) => subject("changes")(projectId, filter),
  change: (projectId: string, changeId: string, filter: Filter = {}) =>
    subject("change")(projectId, changeId, filter),
  inspections: (projectId: string, filter: Filter = {}) => subject("inspections")(projectId, filter),
  audit: (projectId: string, filter: Filter = {}) => subject("audit")(projectId, filter),
  /** Anything else of a project, under its own name. */
  of: (projectId: string, name: string, ...rest: readonly unknown[]) => subject(name)(projectId, ...rest),
} as const;
