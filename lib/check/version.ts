/** Raised when a corrected formula can change a result: checks made under another version become affected. */
export const ENGINE_VERSION = "1";

/**
 * Versions of the methods that this engine composes. A method that is corrected raises its own version; then this record
 * and the engine's version above are raised with it, which a test holds.
 */
export const COMPOSED_METHODS: Readonly<Record<string, string>> = {
  "base-pressure": "1",
  "effective-area": "1",
  sliding: "1",
  overturning: "1",
  uplift: "1",
  "bearing-factors": "1",
  "bearing-resistance": "1",
  "allowable-bearing": "1",
  "value-table": "1",
};
