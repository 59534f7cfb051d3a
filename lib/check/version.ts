/** Raised when a corrected formula can change a result: checks made under another version become affected. */
export const ENGINE_VERSION = "1";
