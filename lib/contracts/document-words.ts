/** Words of documents without their schemas: pages take them from here, and carry no schema to the browser. */
export const documentKinds = [
  "desk study",
  "factual report",
  "ground investigation report",
  "geotechnical design report",
  "addendum",
  "letter",
  "formation record",
  "test certificate",
  "ground data",
  "drawing",
  "loads",
  "other",
] as const;
export type DocumentKind = (typeof documentKinds)[number];

/** Status codes in the ISO 19650 manner, with what each means; S6 and S7 are accepted from older sets. */
export const statusMeanings: Record<string, string> = {
  S0: "work in progress",
  S1: "shared for coordination",
  S2: "shared for information",
  S3: "shared for review and comment",
  S4: "shared for review and authorisation",
  S5: "shared for review and acceptance",
  S6: "withdrawn from use in 2021; accepted from older sets",
  S7: "withdrawn from use in 2021; accepted from older sets",
  A1: "authorised and accepted, stage 1",
  A2: "authorised and accepted, stage 2",
  A3: "authorised and accepted, stage 3",
  A4: "authorised and accepted, stage 4",
  A5: "authorised and accepted, stage 5",
  A6: "authorised and accepted, stage 6",
  A7: "authorised and accepted, stage 7",
};

/** A size in words: bytes, kB or MB, as people write them. */
export const sizeInWords = (size_bytes: number): string =>
  size_bytes < 1000
    ? `${size_bytes} B`
    : size_bytes < 1e6
      ? `${(size_bytes / 1000).toFixed(0)} kB`
      : `${(size_bytes / 1e6).toFixed(1)} MB`;
