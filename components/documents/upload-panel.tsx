"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useRef, useState } from "react";
import { useDropzone } from "react-dropzone";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Progress } from "@/components/ui/progress";
import { putFile } from "@/lib/client/put-file";
import { sizeInWords } from "@/lib/contracts/document-words";
import type { DocumentRow, UploadTicket } from "@/lib/contracts/documents";
import { RegisterFile } from "./register-file";

const LARGEST_BYTES = 2 * 1024 ** 3;
const taken = {
  "application/pdf": [".pdf"],
  "image/png": [".png"],
  "image/jpeg": [".jpg", ".jpeg"],
  "text/csv": [".csv"],
  "text/plain": [".txt", ".ags"],
  "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet": [".xlsx"],
};

type Sending = {
  key: number;
  file: File;
  sent_bytes: number;
  ticket: UploadTicket | null;
  refusal: string | null;
  cancel: () => void;
};
type Props = { projectId: string; documents: DocumentRow[]; documentId?: string };

/** Takes files by drop or choice, sends each straight to the store, and asks what each is once it has arrived. */
export function UploadPanel({ projectId, documents, documentId }: Props) {
  const client = useQueryClient();
  const [sending, setSending] = useState<Sending[]>([]);
  const [refused, setRefused] = useState<string[]>([]);
  const [kept, setKept] = useState<string | null>(null);
  const next = useRef(1);
  const change = (key: number, part: Partial<Sending>) =>
    setSending((all) => all.map((each) => (each.key === key ? { ...each, ...part } : each)));
  const drop = (key: number) => setSending((all) => all.filter((each) => each.key !== key));

  const start = (file: File, again?: number) => {
    const key = again ?? next.current++;
    const abort = new AbortController();
    const fresh: Sending = {
      key,
      file,
      sent_bytes: 0,
      ticket: null,
      refusal: null,
      cancel: () => abort.abort(),
    };
    setSending((all) => (again ? all.map((each) => (each.key === key ? fresh : each)) : [...all, fresh]));
    putFile(projectId, file, {
      signal: abort.signal,
      onProgress: (sent_bytes) => change(key, { sent_bytes }),
    }).then(
      (ticket) => change(key, { ticket, sent_bytes: file.size }),
      (error: Error) =>
        abort.signal.aborted ? drop(key) : change(key, { refusal: error.message, ticket: null }),
    );
  };

  const { getRootProps, getInputProps, isDragActive } = useDropzone({
    accept: taken,
    maxSize: LARGEST_BYTES,
    multiple: !documentId,
    onDrop: (files, rejections) => {
      setKept(null);
      setRefused(
        rejections.map(({ file }) =>
          file.size > LARGEST_BYTES
            ? `${file.name} is larger than 2 GiB.`
            : `${file.name} is not taken: the register takes PDF, PNG, JPEG, XLSX, CSV, AGS and plain text.`,
        ),
      );
      for (const file of files) start(file);
    },
  });

  return (
    <section aria-label="Upload" data-screen-only>
      <div
        {...getRootProps({
          className: `border border-dashed px-5 py-4 ${isDragActive ? "border-action bg-chosen" : "border-field"}`,
        })}
      >
        {/* Hidden by a class: the content policy lets no style attribute through. */}
        <input
          {...getInputProps({
            "aria-label": "Choose files to upload",
            className: "sr-only",
            style: undefined,
          })}
        />
        <p className="font-semibold">
          {documentId
            ? "Drop the new revision here, or press to choose it"
            : "Drop files here, or press to choose them"}
        </p>
        <p className="text-ink-2">PDF, PNG, JPEG, XLSX, CSV, AGS or plain text, up to 2 GiB each.</p>
      </div>
      {refused.map((sentence) => (
        <Notice key={sentence} kind="refused">
          {sentence}
        </Notice>
      ))}
      {kept && <Notice kind="done">{kept}</Notice>}
      {sending.map((each) => (
        <div key={each.key} className="mt-3 border border-rule p-4">
          <p className="font-semibold">
            {each.file.name} <span className="font-normal text-ink-2">{sizeInWords(each.file.size)}</span>
          </p>
          {each.refusal ? (
            <>
              <Notice kind="refused">{each.refusal}</Notice>
              <div className="mt-2 flex gap-3">
                <Button onClick={() => start(each.file, each.key)}>Send again</Button>
                <Button kind="text" onClick={() => drop(each.key)}>
                  Leave it
                </Button>
              </div>
            </>
          ) : each.ticket ? (
            <RegisterFile
              projectId={projectId}
              ticket={each.ticket}
              fileName={each.file.name}
              documents={documents}
              documentId={documentId}
              onKept={(sentence) => {
                drop(each.key);
                setKept(sentence);
                void client.invalidateQueries({ queryKey: ["project", projectId] });
              }}
              onLeft={() => drop(each.key)}
            />
          ) : (
            <Progress
              label={`Sending ${each.file.name}`}
              done={each.sent_bytes}
              total={each.file.size}
              words={`${sizeInWords(each.sent_bytes)} of ${sizeInWords(each.file.size)}`}
              onCancel={each.cancel}
            />
          )}
        </div>
      ))}
    </section>
  );
}
