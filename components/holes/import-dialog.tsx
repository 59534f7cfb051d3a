"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useRef, useState } from "react";
import { useDropzone } from "react-dropzone";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Dialog } from "@/components/ui/dialog";
import { ErrorNote } from "@/components/ui/error-note";
import { Notice } from "@/components/ui/notice";
import { Progress } from "@/components/ui/progress";
import { TextInput } from "@/components/ui/text-input";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import { putFile } from "@/lib/client/put-file";
import { sizeInWords } from "@/lib/contracts/document-words";
import type { GroundPreview } from "@/lib/contracts/ground";
import { FindingsTable } from "./findings-table";

type Step =
  | { at: "choose"; refusal?: string }
  | { at: "sending"; name: string; size: number; sent: number }
  | { at: "reading"; name: string }
  | { at: "preview"; uploadId: string; preview: GroundPreview }
  | { at: "done"; sentence: string };
type Props = { projectId: string; open: boolean; onClose: () => void };

/** Import of an AGS 4 file: sent with progress, looked at, confirmed, then taken in whole or not at all. */
export function ImportDialog({ projectId, open, onClose }: Props) {
  const client = useQueryClient();
  const [step, setStep] = useState<Step>({ at: "choose" });
  const [confirmed, setConfirmed] = useState<string[]>([]);
  const [reference, setReference] = useState("");
  const [title, setTitle] = useState("");
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<Problem | null>(null);
  const abort = useRef<AbortController | null>(null);
  const holes = `/api/projects/${projectId}/holes/import`;

  const start = async (file: File) => {
    const control = new AbortController();
    abort.current = control;
    setProblem(null);
    setConfirmed([]);
    setStep({ at: "sending", name: file.name, size: file.size, sent: 0 });
    try {
      const { uploadId } = await putFile(projectId, file, {
        signal: control.signal,
        onProgress: (sent) => setStep({ at: "sending", name: file.name, size: file.size, sent }),
      });
      setStep({ at: "reading", name: file.name });
      const preview = await fetchJson<GroundPreview>(`${holes}/preview`, {
        method: "POST",
        body: { uploadId },
      });
      setTitle((typed) => typed || `Ground data, ${preview.identity.projectName || file.name}`.slice(0, 200));
      setStep({ at: "preview", uploadId, preview });
    } catch (error) {
      setStep({ at: "choose", refusal: (error as Error).message });
    }
  };
  const accept = async (uploadId: string, preview: GroundPreview) => {
    setBusy(true);
    setProblem(null);
    try {
      const taken = await fetchJson<{ added: number; changed: number; unchanged: number }>(holes, {
        method: "POST",
        idempotencyKey: `import-${uploadId}`,
        body: { uploadId, reference, title, confirmed, sha256: preview.sha256 },
      });
      setStep({
        at: "done",
        sentence: `${taken.added} holes added, ${taken.changed} logs revised, ${taken.unchanged} unchanged.`,
      });
      void client.invalidateQueries({ queryKey: ["project", projectId] });
    } catch (error) {
      if (error instanceof Problem) setProblem(error);
      else throw error;
    } finally {
      setBusy(false);
    }
  };
  const { getRootProps, getInputProps, isDragActive } = useDropzone({
    accept: { "text/plain": [".ags"] },
    multiple: false,
    onDrop: ([file], [refused]) => {
      if (file) void start(file);
      else if (refused)
        setStep({ at: "choose", refusal: `${refused.file.name} is not an AGS file: its name ends in .ags.` });
    },
  });
  const close = () => {
    abort.current?.abort();
    setStep({ at: "choose" });
    onClose();
  };

  return (
    <Dialog
      title="Import AGS data"
      open={open}
      onClose={close}
      width="wide"
      held={step.at === "sending" || busy}
    >
      {step.at === "choose" && (
        <>
          <div
            {...getRootProps({
              className: `border border-dashed px-5 py-6 ${isDragActive ? "border-action bg-chosen" : "border-field"}`,
            })}
          >
            {/* Hidden by a class: the content policy lets no style attribute through. */}
            <input
              {...getInputProps({
                "aria-label": "Choose an AGS file",
                className: "sr-only",
                style: undefined,
              })}
            />
            <p className="font-semibold">Drop an AGS 4 file here, or press to choose it</p>
            <p className="text-ink-2">Nothing is written before you have seen what it would do.</p>
          </div>
          {step.refusal && <Notice kind="refused">{step.refusal}</Notice>}
        </>
      )}
      {step.at === "sending" && (
        <Progress
          label={`Sending ${step.name}`}
          done={step.sent}
          total={step.size}
          words={`${sizeInWords(step.sent)} of ${sizeInWords(step.size)}`}
          onCancel={() => abort.current?.abort()}
        />
      )}
      {step.at === "reading" && <Progress label={`Reading ${step.name}`} done={null} />}
      {step.at === "done" && (
        <>
          <Notice kind="done">{step.sentence}</Notice>
          <div className="mt-4">
            <Button kind="main" onClick={close}>
              Close
            </Button>
          </div>
        </>
      )}
      {step.at === "preview" && (
        <PreviewOf preview={step.preview}>
          {!step.preview.refused && (
            <>
              {step.preview.questions.map(({ code, sentence }) => (
                <Checkbox
                  key={code}
                  label={`${sentence} Take it all the same.`}
                  checked={confirmed.includes(code)}
                  onChange={(event) =>
                    setConfirmed(
                      event.target.checked ? [...confirmed, code] : confirmed.filter((each) => each !== code),
                    )
                  }
                />
              ))}
              <div className="mt-4 grid max-w-2xl gap-4 sm:grid-cols-2">
                <TextInput
                  label="Reference of the file in the register"
                  value={reference}
                  error={problem?.fields.reference}
                  hint="Such as AGS-01."
                  onChange={(event) => setReference(event.target.value)}
                />
                <TextInput
                  label="Title"
                  value={title}
                  error={problem?.fields.title}
                  onChange={(event) => setTitle(event.target.value)}
                />
              </div>
              {problem && <ErrorNote problem={problem} />}
              {problem?.fields.confirmed && <p className="text-fails-text">{problem.fields.confirmed}</p>}
            </>
          )}
          <div className="mt-4 flex gap-3">
            {!step.preview.refused && (
              <Button kind="main" busy={busy} onClick={() => void accept(step.uploadId, step.preview)}>
                Take {step.preview.counts.holes} holes into the register
              </Button>
            )}
            <Button kind="text" onClick={() => setStep({ at: "choose" })}>
              Choose another file
            </Button>
          </div>
        </PreviewOf>
      )}
    </Dialog>
  );
}

function PreviewOf({ preview, children }: { preview: GroundPreview; children: React.ReactNode }) {
  const { identity, counts, holes } = preview;
  const facts = [
    [
      "Project in the file",
      [identity.projectId, identity.projectName].filter(Boolean).join(", ") || "not stated",
    ],
    ["Issue", [identity.issueNumber, identity.issueDate].filter(Boolean).join(", ") || "not stated"],
    ["Data status", identity.dataStatus || "not stated"],
    ["Produced by", identity.producer || "not stated"],
    ["Edition", `${preview.statedEdition ?? "not stated"}, judged as ${preview.edition}`],
    [
      "Holds",
      `${counts.holes} holes, ${counts.strata} strata, ${counts.spts} SPTs, ${counts.strikes} water strikes`,
    ],
    [
      "Would add",
      `${holes.added.length} holes; revise ${holes.changed.length} logs; leave ${holes.unchanged} as they are`,
    ],
    [
      "Not in the file",
      holes.missing.length === 0 ? "none" : `${holes.missing.length} held holes; they stay`,
    ],
    [
      "Without place or level",
      `${holes.unlocated} without coordinates, ${holes.withoutLevel} without ground level`,
    ],
  ] as const;
  return (
    <>
      {preview.refused && <Notice kind="refused">{preview.refused}</Notice>}
      <dl className="grid grid-cols-[max-content_1fr] gap-x-6 gap-y-1">
        {facts.map(([term, value]) => (
          <div key={term} className="contents">
            <dt className="text-ink-2">{term}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
      {counts.otherGroups.length > 0 && (
        <p className="mt-2 text-ink-2">Kept with the file as they came: {counts.otherGroups.join(", ")}.</p>
      )}
      <p className="mt-3 max-w-prose text-ink-2">
        The data are converted as listed below. Compare them with the signed report, which governs.
      </p>
      <FindingsTable findings={preview.findings} counts={preview.findingCounts} />
      {children}
    </>
  );
}
