/** The one table of who may do what. Verbs are `subject:act`; a test walks every route with every role. */
export const roles = ["geotechnical", "structural", "lead", "reader"] as const;
export type Role = (typeof roles)[number];

/** How a role is written on the screen. */
export const roleTitles: Record<Role, string> = {
  geotechnical: "Geotechnical engineer",
  structural: "Structural engineer",
  lead: "Project lead",
  reader: "Reader",
};

const everyone = roles;
const geotechnical = ["geotechnical"] as const;
const structural = ["structural"] as const;
const lead = ["lead"] as const;

export const policy = {
  "project:read": everyone,
  "project:change": lead,
  "criteria:change": lead,
  "member:change": lead,
  "audit:read": ["lead", "geotechnical", "structural"],
  "document:write": ["geotechnical", "structural", "lead"],
  "hole:write": geotechnical,
  "unit:write": geotechnical,
  "zone:write": geotechnical,
  "value:draft": geotechnical,
  "revision:check": geotechnical,
  "revision:issue": ["geotechnical", "lead"],
  "revision:withdraw": ["geotechnical", "lead"],
  "source:confirm": geotechnical,
  "footing:write": structural,
  "footing:link": structural,
  "check:run": structural,
  "consequence:answer": structural,
  "consequence:accept": lead,
  "change:close": lead,
  "stage:record": ["structural", "geotechnical", "lead"],
  "inspection:record": ["geotechnical", "structural"],
  "token:own": everyone,
} as const satisfies Record<string, readonly Role[]>;

export type Verb = keyof typeof policy;

/** True when one of the roles may do the act. */
export const may = (held: readonly Role[], verb: Verb): boolean =>
  held.some((role) => (policy[verb] as readonly Role[]).includes(role));
