import { randomUUID } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import { finishUploadInput } from "@/lib/contracts/documents";
import type { DocumentId, DocumentRevisionId, UploadId } from "@/lib/contracts/ids";
import { copy, remove } from "@/lib/storage/client";
import { claimedKind, type FileKind } from "@/lib/storage/real-type";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, Invalid, NotFound, Refusal, Unavailable } from "../errors";
import { faultPoint } from "../faults";
import { parse } from "../parse";
import { verifyObject } from "./verify-object";

type Upload = typeof t.upload.$inferSelect;
type Given = ReturnType<typeof finishUploadInput.parse>;

/**
 * Records an uploaded file as a document revision: verified, moved to a key that nobody was handed, then written down
 * with everything that it supersedes, in one transaction. A refused file leaves no row and no object.
 */
export async function finishUpload(context: Context, given: unknown) {
  assertMay(context, "document:write");
  const wanted = parse(finishUploadInput, given);
  const upload = await waitingUpload(context, wanted.uploadId);
  const kind = claimedKind(upload.fileName) as FileKind;
  const objectKey = `documents/${context.projectId}/${randomUUID()}`;
  let sha256: string;
  try {
    const verified = await verifyObject(upload.objectKey, {
      kind,
      size_bytes: upload.size_bytes,
      sha256: wanted.sha256,
    });
    sha256 = verified.sha256;
    const copied = await copy(upload.objectKey, objectKey);
    // Between reading and copying the sender could have written again: only what was verified may stay.
    if (copied === null || bare(copied) !== bare(verified.etag))
      throw new Conflict("The file was written again while it was being verified. Please send it anew.");
  } catch (error) {
    await remove(objectKey).catch(() => {});
    if (error instanceof Refusal && !(error instanceof Unavailable))
      await refuseUpload(context, upload, error.message);
    throw error;
  }
  try {
    const answer = await inProject(context, (tx) =>
      recordFile(tx, context, wanted, upload, { objectKey, sha256 }),
    );
    await remove(upload.objectKey).catch(() => {});
    return answer;
  } catch (error) {
    await remove(objectKey).catch(() => {});
    throw error;
  }
}

const bare = (etag: string): string => etag.replace(/^W\/|"/g, "");

export async function waitingUpload(context: Context, uploadId: UploadId): Promise<Upload> {
  const [found] = await inProject({ ...context, keyed: undefined }, (tx) =>
    tx
      .select()
      .from(t.upload)
      .where(
        and(
          eq(t.upload.projectId, context.projectId),
          eq(t.upload.id, uploadId),
          eq(t.upload.startedBy, context.person.id),
        ),
      ),
  );
  if (!found) throw new NotFound("There is no such upload of yours.");
  if (found.state !== "waiting") throw new Conflict(`This upload is ${found.state} already.`);
  return found;
}

export async function refuseUpload(context: Context, upload: Upload, refusal: string): Promise<void> {
  await inProject({ ...context, keyed: undefined }, async (tx) => {
    await tx
      .update(t.upload)
      .set({ state: "refused", refusal, finishedAt: new Date() })
      .where(and(eq(t.upload.projectId, context.projectId), eq(t.upload.id, upload.id)));
    await audit(tx, context, { verb: "upload:refuse", subject: `upload/${upload.id}`, detail: { refusal } });
  });
  await remove(upload.objectKey).catch(() => {});
}

/** Writes one verified file down as a document revision; audits only where it is the whole act. */
export async function recordFile(
  tx: Transaction,
  context: Context,
  given: Given,
  upload: Upload,
  stored: { objectKey: string; sha256: string },
  options: { audited: boolean } = { audited: true },
) {
  const { projectId } = context;
  if (!given.evenIfHere) await refuseIfHere(tx, context, stored.sha256);
  const document = await documentFor(tx, context, given);
  const documentRevisionId = randomUUID() as DocumentRevisionId;
  const [last] = await tx
    .select({ number: sql<number>`coalesce(max(number), 0)::int` })
    .from(t.documentRevision)
    .where(and(eq(t.documentRevision.projectId, projectId), eq(t.documentRevision.documentId, document.id)));
  const [sameCode] = await tx
    .select({ number: t.documentRevision.number })
    .from(t.documentRevision)
    .where(
      and(
        eq(t.documentRevision.projectId, projectId),
        eq(t.documentRevision.documentId, document.id),
        eq(t.documentRevision.code, given.code),
      ),
    );
  if (sameCode)
    throw new Invalid(`${document.reference} has a revision ${given.code} already.`, {
      code: "Give the next code.",
    });
  await tx.insert(t.documentRevision).values({
    projectId,
    id: documentRevisionId,
    documentId: document.id,
    number: (last?.number ?? 0) + 1,
    code: given.code,
    status: given.status,
    receivedOn: given.receivedOn,
    limitations: given.limitations,
    fileName: upload.fileName,
    mediaType: upload.mediaType,
    size_bytes: upload.size_bytes,
    sha256: stored.sha256,
    objectKey: stored.objectKey,
    supersedes: document.currentRevisionId,
    uploadedBy: context.person.id,
  });
  await faultPoint("document:recorded");
  await tx
    .update(t.document)
    .set({ currentRevisionId: documentRevisionId, revision: document.revision + 1 })
    .where(and(eq(t.document.projectId, projectId), eq(t.document.id, document.id)));
  const taken = await tx
    .update(t.upload)
    .set({ state: "finished", sha256: stored.sha256, finishedAt: new Date() })
    .where(and(eq(t.upload.projectId, projectId), eq(t.upload.id, upload.id), eq(t.upload.state, "waiting")));
  if (taken.rowCount !== 1) throw new Conflict("This upload was finished or cancelled meanwhile.");
  if (document.currentRevisionId)
    await recordChange(tx, context, {
      kind: "document-superseded",
      subjectId: document.id,
      title: `${document.reference} ${document.title} superseded: ${document.currentCode} → ${given.code}`,
      reason: `Revision ${given.code} was received on ${given.receivedOn}.`,
      fromRevisionId: document.currentRevisionId,
      toRevisionId: documentRevisionId,
    });
  // An act that takes a file in along with other things writes one record of the whole.
  if (options.audited)
    await audit(tx, context, {
      verb: "document:revise",
      subject: `document/${document.id}`,
      detail: {
        reference: document.reference,
        code: given.code,
        status: given.status,
        fileName: upload.fileName,
        sha256: stored.sha256,
        supersedes: document.currentRevisionId,
      },
    });
  return {
    documentId: document.id,
    documentRevisionId,
    reference: document.reference,
    code: given.code,
    sha256: stored.sha256,
    revision: document.revision + 1,
  };
}

async function refuseIfHere(tx: Transaction, context: Context, sha256: string): Promise<void> {
  const [here] = await tx
    .select({ reference: t.document.reference, documentId: t.document.id, code: t.documentRevision.code })
    .from(t.documentRevision)
    .innerJoin(
      t.document,
      and(
        eq(t.document.projectId, t.documentRevision.projectId),
        eq(t.document.id, t.documentRevision.documentId),
      ),
    )
    .where(and(eq(t.documentRevision.projectId, context.projectId), eq(t.documentRevision.sha256, sha256)))
    .limit(1);
  if (here)
    throw new Conflict(`This very file is in the register already, as ${here.reference} ${here.code}.`, {
      documentId: here.documentId,
      reference: here.reference,
      here: here.code,
    });
}

async function documentFor(tx: Transaction, context: Context, given: Given) {
  const { projectId } = context;
  if (given.documentId) {
    const [found] = await tx
      .select()
      .from(t.document)
      .where(and(eq(t.document.projectId, projectId), eq(t.document.id, given.documentId)))
      .for("update");
    if (!found) throw new NotFound("There is no such document in this project.");
    const [current] = found.currentRevisionId
      ? await tx
          .select({ code: t.documentRevision.code })
          .from(t.documentRevision)
          .where(
            and(
              eq(t.documentRevision.projectId, projectId),
              eq(t.documentRevision.id, found.currentRevisionId),
            ),
          )
      : [];
    return { ...found, currentCode: current?.code ?? "" };
  }
  const reference = given.reference as string;
  const [taken] = await tx
    .select({ id: t.document.id })
    .from(t.document)
    .where(and(eq(t.document.projectId, projectId), eq(t.document.reference, reference)));
  if (taken)
    throw new Invalid(`There is a document ${reference} already.`, {
      reference: "Taken: record the file as a new revision of that document, or give another reference.",
    });
  const id = randomUUID() as DocumentId;
  const row = { title: given.title as string, kind: given.kind as string, author: given.author };
  await tx.insert(t.document).values({ projectId, id, reference, ...row });
  return { id, reference, ...row, currentRevisionId: null, currentCode: "", revision: 1 };
}
