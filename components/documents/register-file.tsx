"use client";

import { type FormEvent, useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { Textarea } from "@/components/ui/textarea";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import { documentKinds, statusMeanings } from "@/lib/contracts/document-words";
import type { DocumentRow, UploadTicket } from "@/lib/contracts/documents";

type Props = {
  projectId: string;
  ticket: UploadTicket;
  fileName: string;
  documents: DocumentRow[];
  /** Set on a document's own page: the file can only be a revision of it. */
  documentId?: string;
  onKept: (sentence: string) => void;
  onLeft: () => void;
};

const NEW = "new";

/** What an arrived file is: a new document, or a new revision of one that is held. Typed values outlive a refusal. */
export function RegisterFile(props: Props) {
  const { projectId, ticket, fileName, documents, documentId, onKept, onLeft } = props;
  const [of, setOf] = useState(documentId ?? NEW);
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<Problem | null>(null);
  const [evenIfHere, setEvenIfHere] = useState(false);
  const uploads = `/api/projects/${projectId}/documents/uploads/${ticket.uploadId}`;
  const held = documents.find(({ id }) => id === of);

  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const typed = Object.fromEntries(new FormData(event.currentTarget)) as Record<string, string>;
    const { code, status, receivedOn, limitations, reference, title, kind, author } = typed;
    setBusy(true);
    setProblem(null);
    try {
      const kept = await fetchJson<{ reference: string; code: string }>(`${uploads}/finish`, {
        method: "POST",
        idempotencyKey: `finish-${ticket.uploadId}-${evenIfHere}`.slice(0, 128),
        body: {
          ...(of === NEW ? { reference, title, kind: kind || undefined, author } : { documentId: of }),
          code,
          status,
          receivedOn,
          limitations,
          evenIfHere,
        },
      });
      onKept(`${fileName} is kept as ${kept.reference} ${kept.code}.`);
    } catch (error) {
      if (error instanceof Problem) {
        setProblem(error);
        if (error.extra.here) setEvenIfHere(true);
      } else throw error;
    } finally {
      setBusy(false);
    }
  };
  const leave = () => {
    void fetchJson(`${uploads}/cancel`, { method: "POST", body: {} }).catch(() => {});
    onLeft();
  };
  const said = problem?.fields ?? {};
  return (
    <form method="post" onSubmit={(event) => void submit(event)} noValidate className="mt-3">
      <div className="grid max-w-3xl gap-x-6 gap-y-3 sm:grid-cols-2">
        {!documentId && (
          <Select
            label="This file is"
            value={of}
            onChange={(event) => setOf(event.target.value)}
            options={[
              { value: NEW, label: "a new document" },
              ...documents.map(({ id, reference, title }) => ({
                value: id,
                label: `a new revision of ${reference} ${title}`,
              })),
            ]}
          />
        )}
        {of === NEW && (
          <>
            <TextInput label="Reference" name="reference" error={said.reference} hint="Such as GIR-01." />
            <TextInput label="Title" name="title" error={said.title} />
            <Select
              label="Kind"
              name="kind"
              error={said.kind}
              defaultValue=""
              placeholder="Choose one"
              options={documentKinds.map((value) => ({ value, label: value }))}
            />
            <TextInput label="Author or firm" name="author" optional error={said.author} />
          </>
        )}
        <TextInput
          label="Revision code"
          name="code"
          error={said.code}
          hint={held?.code ? `The last is ${held.code}.` : "Such as P01 or C01."}
        />
        <Select
          label="Status"
          name="status"
          error={said.status}
          defaultValue=""
          placeholder="Choose one"
          options={Object.entries(statusMeanings).map(([value, meaning]) => ({
            value,
            label: `${value}, ${meaning}`,
          }))}
        />
        <TextInput label="Received on" name="receivedOn" type="date" error={said.receivedOn} />
        <Textarea
          label="Known limitations"
          name="limitations"
          optional
          error={said.limitations}
          hint="Area, depth, scheme or date beyond which the report does not speak."
        />
      </div>
      {problem && <ErrorNote problem={problem} fieldsShown={Object.keys(said)} />}
      {said.file && <p className="mt-2 text-fails-text">{said.file}</p>}
      <div className="mt-4 flex gap-3">
        <Button kind="main" type="submit" busy={busy}>
          {evenIfHere ? "Keep it once more" : "Keep in the register"}
        </Button>
        <Button kind="text" type="button" onClick={leave}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
