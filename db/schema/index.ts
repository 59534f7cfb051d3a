/** Every table, by subject: what Drizzle generates migrations from. */
export * from "./checks";
export * from "./documents";
export * from "./footings";
export * from "./ground";
export * from "./inspections";
export * from "./people";
export * from "./projects";
export * from "./record";
export * from "./values";
export * from "./zones";
