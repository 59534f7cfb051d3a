import { randomUUID } from "node:crypto";
import * as t from "@/db/schema";
import { finishUploadInput } from "@/lib/contracts/documents";
import { acceptGroundInput } from "@/lib/contracts/ground";
import { put, remove } from "@/lib/storage/client";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { recordFile, waitingUpload } from "../documents/finish-upload";
import { Conflict, Invalid } from "../errors";
import { faultPoint } from "../faults";
import { parse } from "../parse";
import { keepLogs } from "./keep-logs";
import { bytesOf, readGroundFile } from "./read-ground-file";

/**
 * Takes a previewed AGS file into the register in one transaction: the file as a document revision, new holes, a new
 * revision of each changed log. Holes that the file does not mention stay as they are.
 */
export async function acceptGround(context: Context, given: unknown) {
  assertMay(context, "hole:write");
  const { uploadId, reference, title, confirmed, sha256 } = parse(acceptGroundInput, given);
  const upload = await waitingUpload(context, uploadId);
  const bytes = await bytesOf(upload.objectKey, upload.size_bytes);
  const dataIssueId = randomUUID();
  const objectKey = `documents/${context.projectId}/${randomUUID()}`;
  await put(objectKey, bytes, upload.mediaType);
  try {
    const answer = await inProject(context, async (tx) => {
      const file = await readGroundFile(tx, context, { bytes, fileName: upload.fileName, dataIssueId });
      const { preview, ground, held } = file;
      if (preview.sha256 !== sha256)
        throw new Conflict("The file is not the one that was previewed. Please look at it again.");
      if (preview.refused) throw new Invalid(preview.refused, { file: preview.refused });
      const open = preview.questions.filter((question) => !confirmed.includes(question.code));
      if (open.length > 0)
        throw new Invalid("Some things about this file have to be confirmed first.", {
          confirmed: open.map((question) => question.sentence).join(" "),
        });
      const { documentRevisionId, documentId } = await recordFile(
        tx,
        context,
        finishUploadInput.parse({
          uploadId,
          reference,
          title,
          kind: "ground data",
          author: preview.identity.producer.slice(0, 200),
          code: "P01",
          status: "S2",
          receivedOn: new Date().toISOString().slice(0, 10),
        }),
        upload,
        { objectKey, sha256: preview.sha256 },
        { audited: false },
      );
      await tx.insert(t.dataIssue).values({
        projectId: context.projectId,
        id: dataIssueId,
        documentRevisionId,
        fileName: upload.fileName,
        sha256: preview.sha256,
        edition: preview.edition,
        fileProjectId: preview.identity.projectId,
        fileProjectName: preview.identity.projectName,
        issueNumber: preview.identity.issueNumber,
        issueDate: preview.identity.issueDate,
        dataStatus: preview.identity.dataStatus,
        producer: preview.identity.producer,
        findings: file.findings,
        otherGroups: ground.otherGroups,
        importedBy: context.person.id,
      });
      const logs = file.logs.map((log) => {
        const before = held.get(log.name);
        return before ? { ...log, holeId: before.id, number: before.number + 1, newName: null } : log;
      });
      if (logs.length > 0) await keepLogs(tx, context, logs);
      await faultPoint("ground:kept");
      const changed = logs.filter((log) => log.newName === null);
      for (const log of changed.slice(0, 20))
        await recordChange(tx, context, {
          kind: "hole-revised",
          subjectId: log.holeId,
          title: `Log of ${log.name} revised: ${log.number - 1} → ${log.number}`,
          reason: `${upload.fileName}, issue ${preview.identity.issueNumber || "without number"}`,
          fromRevisionId: held.get(log.name)?.revisionId ?? null,
          toRevisionId: log.revisionId,
        });
      const counts = {
        added: logs.length - changed.length,
        changed: changed.length,
        unchanged: preview.holes.unchanged,
      };
      await audit(tx, context, {
        verb: "ground:import",
        subject: `document/${documentId}`,
        detail: {
          fileName: upload.fileName,
          sha256: preview.sha256,
          ...counts,
          confirmed,
          findings: preview.findingCounts,
        },
      });
      return { documentId, documentRevisionId, dataIssueId, ...counts };
    });
    await remove(upload.objectKey).catch(() => {});
    return answer;
  } catch (error) {
    await remove(objectKey).catch(() => {});
    throw error;
  }
}
