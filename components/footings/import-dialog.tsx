"use client";

import { useState } from "react";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { useFootingChange } from "@/lib/client/use-footings";
import { type LoadBasis, loadBases, loadBasisTitles } from "@/lib/contracts/footing-words";
import type { ImportAnswer, ImportPreview } from "@/lib/contracts/footings";
import { textOfFile } from "./file-text";
import { ImportPreviewTables } from "./import-preview";

type Props = { projectId: string; onDone: (sentence: string) => void; onClose: () => void };
type What = "footings" | "loads";
type Step = "choose" | "reading" | "shown" | "writing";

const stepWords: Partial<Record<Step, string>> = {
  reading: "Reading the file and comparing it with the register …",
  writing: "Writing it into the register …",
};

/** Brings a schedule of footings, or their load combinations, in from CSV: first shown, then accepted, then written whole. */
export function ImportDialog({ projectId, onDone, onClose }: Props) {
  const change = useFootingChange(projectId);
  const [what, setWhat] = useState<What>("footings");
  const [basis, setBasis] = useState<LoadBasis | "">("");
  const [source, setSource] = useState("");
  const [file, setFile] = useState<{ name: string; text: string } | null>(null);
  const [preview, setPreview] = useState<ImportPreview | null>(null);
  const [leaveOut, setLeaveOut] = useState(false);
  const [reason, setReason] = useState("");
  const [step, setStep] = useState<Step>("choose");
  const [problem, setProblem] = useState("");
  const path = what === "footings" ? "footings/import" : "footings/import/loads";
  const busy = step === "reading" || step === "writing";
  const stated = (given: { name: string; text: string }) => ({
    content: given.text,
    fileName: given.name,
    ...(what === "loads" ? { loadBasis: basis, source } : {}),
  });

  const show = async (given: { name: string; text: string }) => {
    setStep("reading");
    setProblem("");
    const answer = await change<ImportPreview>(`${path}/preview`, "POST", stated(given));
    setStep(answer.done ? "shown" : "choose");
    setPreview(answer.done ? answer.body : null);
    if (!answer.done) setProblem([answer.refused.detail, ...Object.values(answer.refused.fields)].join(" "));
  };
  const onFile = async (chosen: File | undefined) => {
    setPreview(null);
    setProblem("");
    if (!chosen) return setFile(null);
    const read = await textOfFile(chosen);
    if ("problem" in read) {
      setFile(null);
      return setProblem(read.problem);
    }
    const given = { name: chosen.name, text: read.text };
    setFile(given);
    await show(given);
  };
  const onAccept = async () => {
    if (!file || !preview || busy) return;
    setStep("writing");
    const answer = await change<ImportAnswer>(path, "POST", {
      ...stated(file),
      fingerprint: preview.fingerprint,
      reason,
      ...(what === "footings" ? { leaveOutErrors: leaveOut } : {}),
    });
    if (answer.done) {
      const { new: added, changed, unchanged, leftOut } = answer.body;
      return onDone(
        `${file.name}: ${added} new, ${changed} changed, ${unchanged} unchanged${leftOut > 0 ? `, ${leftOut} rows left out` : ""}.`,
      );
    }
    setStep("shown");
    setProblem(answer.refused.detail);
    // Somebody was first: what the file would do now is shown at once, and nothing has to be chosen again.
    if (answer.refused.status === 409) await show(file).then(() => setProblem(answer.refused.detail));
  };
  const again = (next: What) => {
    setWhat(next);
    setPreview(null);
    setFile(null);
    setProblem("");
    setStep("choose");
  };
  const inError = preview?.counts.inError ?? 0;
  const writes = preview ? preview.counts.new + preview.counts.changed : 0;
  const ready =
    preview?.refused === null && writes > 0 && (inError === 0 || (leaveOut && what === "footings"));

  return (
    <Dialog title="Import from CSV" open width="wide" held={step === "writing"} onClose={onClose}>
      <fieldset className="mt-4 flex gap-5" disabled={busy}>
        <legend className="sr-only">What the file holds</legend>
        {(["footings", "loads"] as const).map((each) => (
          <label key={each} className="flex items-center gap-1.5">
            <input type="radio" name="what" checked={what === each} onChange={() => again(each)} />
            {each === "footings" ? "footings: size, place, levels" : "loads: one row a combination"}
          </label>
        ))}
      </fieldset>
      {what === "loads" && (
        <div className="mt-3 grid gap-3 sm:grid-cols-2">
          <label className="block">
            <span className="block">Basis of the loads (no default: a person must say)</span>
            <select
              value={basis}
              disabled={busy}
              onChange={(event) => {
                setBasis(event.target.value as LoadBasis);
                setPreview(null);
              }}
              className="mt-1 w-full border border-field bg-sheet px-2 py-1.5"
            >
              <option value="">Choose</option>
              {loadBases.map((each) => (
                <option key={each} value={each}>
                  {loadBasisTitles[each]}
                </option>
              ))}
            </select>
          </label>
          <label className="block">
            <span className="block">Where they come from (model, issue)</span>
            <input
              value={source}
              maxLength={300}
              onChange={(event) => setSource(event.target.value)}
              className="mt-1 w-full border border-field bg-sheet px-2 py-1.5"
            />
          </label>
        </div>
      )}
      <label className="mt-3 block">
        <span className="block">File (CSV, at most 8 MB)</span>
        <input
          key={what}
          type="file"
          accept=".csv,.txt,text/csv"
          disabled={busy || (what === "loads" && basis === "")}
          onChange={(event) => void onFile(event.target.files?.[0])}
          className="mt-1 block"
        />
      </label>
      {file && !preview && !busy && (
        <button
          type="button"
          className="mt-3 border border-field px-3 py-1.5"
          onClick={() => void show(file)}
        >
          Show what {file.name} would do
        </button>
      )}
      {busy && (
        <p role="status" className="mt-3">
          {stepWords[step]}
          <progress className="ml-3 align-middle" />
        </p>
      )}
      {problem && (
        <Notice kind="refused" className="mt-3">
          {problem}
        </Notice>
      )}
      {preview && <ImportPreviewTables preview={preview} />}
      {preview && preview.refused === null && (
        <div className="mt-4 grid gap-3">
          {inError > 0 && what === "footings" && (
            <label className="flex items-center gap-1.5">
              <input
                type="checkbox"
                checked={leaveOut}
                onChange={(event) => setLeaveOut(event.target.checked)}
              />
              Leave out the {inError} {inError === 1 ? "row" : "rows"} in error and import the rest
            </label>
          )}
          {inError > 0 && what === "loads" && (
            <p>
              Correct the rows in error first: without one of its combinations a footing would be checked for
              too little.
            </p>
          )}
          {preview.counts.changed > 0 && (
            <label className="block max-w-xl">
              <span className="block">Reason for the changes</span>
              <input
                value={reason}
                maxLength={1000}
                onChange={(event) => setReason(event.target.value)}
                className="mt-1 w-full border border-field bg-sheet px-2 py-1.5"
              />
            </label>
          )}
          <button
            type="button"
            aria-disabled={!ready || busy}
            onClick={() => ready && void onAccept()}
            className="justify-self-start bg-action px-4 py-2 text-on-action aria-disabled:opacity-60"
          >
            {writes === 0
              ? "Nothing to write"
              : `Accept: write ${writes} ${writes === 1 ? "footing" : "footings"}`}
          </button>
        </div>
      )}
    </Dialog>
  );
}
