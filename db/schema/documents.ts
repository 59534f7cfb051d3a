import { bigint, foreignKey, index, integer, pgTable, primaryKey, text, unique } from "drizzle-orm/pg-core";
import type { DocumentId, DocumentRevisionId, PersonId, UploadId } from "@/lib/contracts/ids";
import { id, moment, projectKey } from "./columns";
import { person } from "./people";
import { project } from "./projects";

/** A report, log or drawing under one reference. Which revision counts is one pointer. */
export const document = pgTable(
  "document",
  {
    projectId: projectKey().references(() => project.id),
    id: id<DocumentId>("id").notNull().defaultRandom(),
    reference: text("reference").notNull(),
    title: text("title").notNull(),
    kind: text("kind").notNull(),
    author: text("author").notNull().default(""),
    currentRevisionId: id<DocumentRevisionId>("current_revision_id"),
    revision: integer("revision").notNull().default(1),
    createdAt: moment("created_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    unique("document_reference").on(t.projectId, t.reference),
  ],
);

/** One stored file of a document. Never changes once written. */
export const documentRevision = pgTable(
  "document_revision",
  {
    projectId: projectKey(),
    id: id<DocumentRevisionId>("id").notNull().defaultRandom(),
    documentId: id<DocumentId>("document_id").notNull(),
    /** Order within the document; codes such as P01.02 do not sort as text. */
    number: integer("number").notNull(),
    code: text("code").notNull(),
    status: text("status").notNull(),
    receivedOn: text("received_on").notNull(),
    fileName: text("file_name").notNull(),
    mediaType: text("media_type").notNull(),
    size_bytes: bigint("size_bytes", { mode: "number" }).notNull(),
    sha256: text("sha256").notNull(),
    objectKey: text("object_key").notNull(),
    pages: integer("pages"),
    limitations: text("limitations").notNull().default(""),
    supersedes: id<DocumentRevisionId>("supersedes"),
    uploadedBy: id<PersonId>("uploaded_by")
      .notNull()
      .references(() => person.id),
    uploadedAt: moment("uploaded_at").notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.id] }),
    foreignKey({ columns: [t.projectId, t.documentId], foreignColumns: [document.projectId, document.id] }),
    unique("document_revision_number").on(t.projectId, t.documentId, t.number),
    unique("document_revision_code").on(t.projectId, t.documentId, t.code),
    unique("document_revision_object").on(t.projectId, t.objectKey),
    index("document_revision_hash").on(t.projectId, t.sha256),
  ],
);

/** A file on its way: handed a presigned request, not yet verified. Finished or swept, never relied on. */
export const upload = pgTable(
  "upload",
  {
    projectId: projectKey().references(() => project.id),
    id: id<UploadId>("id").notNull().defaultRandom(),
    objectKey: text("object_key").notNull(),
    fileName: text("file_name").notNull(),
    mediaType: text("media_type").notNull(),
    size_bytes: bigint("size_bytes", { mode: "number" }).notNull(),
    sha256: text("sha256"),
    state: text("state")
      .$type<"waiting" | "finished" | "refused" | "cancelled">()
      .notNull()
      .default("waiting"),
    refusal: text("refusal"),
    startedBy: id<PersonId>("started_by")
      .notNull()
      .references(() => person.id),
    startedAt: moment("started_at").notNull().defaultNow(),
    finishedAt: moment("finished_at"),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.id] }), unique("upload_object").on(t.projectId, t.objectKey)],
);
