import { z } from "zod";
import { type DocumentKind, documentKinds, statusMeanings } from "./document-words";
import type { DocumentId, DocumentRevisionId, UploadId, ValueRevisionId } from "./ids";
import { plainText } from "./plain-text";

const uuid = <Brand extends string>() =>
  z.guid("This is not an id.").transform((text) => text.toLowerCase() as Brand);

/** Largest file that one request may carry (5 GiB is the limit of one PUT in S3). */
export const LARGEST_FILE_BYTES = 2 * 1024 ** 3;

const filled = (label: string, limit: number) =>
  plainText(limit)
    .transform((text) => text.trim())
    .refine((text) => text !== "", `${label} is missing.`);

export const beginUploadInput = z.strictObject({
  fileName: plainText(255)
    .refine(
      (name) => name.trim() !== "" && !/[\\/\p{Cc}\u202a-\u202e\u2066-\u2069]/u.test(name),
      "This file name has characters that a name cannot have.",
    )
    .meta({ label: "File name" }),
  size_bytes: z
    .int("The size must be a whole number of bytes.")
    .min(1, "The file is empty.")
    .max(LARGEST_FILE_BYTES, "The file is larger than 2 GiB."),
});
export const uploadInput = z.strictObject({ uploadId: uuid<UploadId>() });

const revisionFields = {
  code: filled("Revision code", 20).refine(
    (code) => /^[A-Z0-9][A-Z0-9.]*$/i.test(code),
    "A revision code is letters and digits, such as P01, P02.01, C01 or A.",
  ),
  status: z.string().refine((status) => status in statusMeanings, "Choose one of the status codes."),
  receivedOn: z.iso.date("A date as 2026-03-31."),
  limitations: plainText(4000).default(""),
};

export const finishUploadInput = z
  .strictObject({
    uploadId: uuid<UploadId>(),
    /** The document that this is a new revision of; without it, the file starts a new document. */
    documentId: uuid<DocumentId>().optional(),
    reference: filled("Reference", 60).optional(),
    title: filled("Title", 200).optional(),
    kind: z.enum(documentKinds, { error: "Choose what kind of document this is." }).optional(),
    author: plainText(200).default(""),
    ...revisionFields,
    /** SHA-256 as the browser worked it out, where it did; the server's own must agree. */
    sha256: z
      .string()
      .regex(/^[0-9a-f]{64}$/, "A SHA-256 has 64 hexadecimal digits.")
      .optional(),
    /** The same bytes are in the register already, and are meant to be kept again. */
    evenIfHere: z.boolean().default(false),
  })
  .superRefine((given, context) => {
    if (given.documentId) return;
    for (const field of ["reference", "title", "kind"] as const)
      if (given[field] === undefined)
        context.addIssue({ code: "custom", path: [field], message: "A new document needs this." });
  });

export const changeDocumentInput = z.strictObject({
  documentId: uuid<DocumentId>(),
  title: filled("Title", 200),
  kind: z.enum(documentKinds),
  author: plainText(200),
  revision: z.int(),
});
export const readDocumentInput = z.strictObject({ documentId: uuid<DocumentId>() });
export const downloadInput = z.strictObject({
  documentId: uuid<DocumentId>(),
  documentRevisionId: uuid<DocumentRevisionId>(),
});

export type FinishUploadInput = z.input<typeof finishUploadInput>;
export type BeginUploadInput = z.input<typeof beginUploadInput>;

export type UploadTicket = { uploadId: UploadId; url: string; mediaType: string };
export type DocumentRow = {
  id: DocumentId;
  revision: number;
  reference: string;
  title: string;
  kind: DocumentKind;
  author: string;
  currentRevisionId: DocumentRevisionId | null;
  code: string | null;
  status: string | null;
  receivedOn: string | null;
  fileName: string | null;
  mediaType: string | null;
  size_bytes: number | null;
  revisions: number;
  /** Value revisions that cite any revision of it. */
  citations: number;
};
export type DocumentRevisionRow = {
  id: DocumentRevisionId;
  number: number;
  code: string;
  status: string;
  receivedOn: string;
  fileName: string;
  mediaType: string;
  size_bytes: number;
  sha256: string;
  limitations: string;
  uploadedBy: string;
  uploadedAt: string;
  current: boolean;
};
export type Citation = {
  kind: "bearing value" | "hole" | "footing loads" | "footing";
  id: string;
  reference: string;
  code: string;
  page: number | null;
  clause: string;
  documentRevisionId: DocumentRevisionId;
  valueRevisionId?: ValueRevisionId;
  state?: string;
};
export type DocumentPage = DocumentRow & { revisionRows: DocumentRevisionRow[]; citationRows: Citation[] };
