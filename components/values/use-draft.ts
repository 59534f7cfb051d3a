"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect, useRef, useState } from "react";
import { type Refused, send } from "@/lib/client/send";
import type { DraftContent, ValueDraft } from "@/lib/contracts/values";

/** How long after the last keystroke a draft is saved. */
const PAUSE_MS = 700;

export type Saving = "saved" | "typing" | "saving" | "not saved";

/**
 * A draft that saves itself: one save at a time, each on the revision that the last one made, so that a second writer is
 * noticed and nothing typed is lost. A refusal stays until the next save succeeds.
 */
export function useDraft(projectId: string, valueId: string, draft: ValueDraft) {
  const queries = useQueryClient();
  const [content, setContent] = useState<DraftContent>(draft.content);
  const [saving, setSaving] = useState<Saving>("saved");
  const [refused, setRefused] = useState<Refused>();
  const [revision, setRevision] = useState(draft.revision);
  const latest = useRef({ content, revision: draft.revision, pending: false, running: false });
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  const save = useCallback(async (): Promise<boolean> => {
    const now = latest.current;
    clearTimeout(timer.current);
    if (now.running) return false;
    if (!now.pending) return true;
    now.running = true;
    now.pending = false;
    setSaving("saving");
    const answer = await send<{ revision: number }>(
      `/api/projects/${projectId}/values/${valueId}/draft`,
      "PUT",
      { content: now.content },
      now.revision,
    );
    now.running = false;
    if (!answer.done) {
      now.pending = true;
      setRefused(answer.refused);
      setSaving("not saved");
      return false;
    }
    now.revision = answer.body.revision;
    setRevision(answer.body.revision);
    setRefused(undefined);
    setSaving(now.pending ? "typing" : "saved");
    void queries.invalidateQueries({ queryKey: ["project", projectId, "value", valueId] });
    return now.pending ? save() : true;
  }, [projectId, valueId, queries]);

  const change = useCallback(
    (over: Partial<DraftContent>) => {
      const now = latest.current;
      now.content = { ...now.content, ...over };
      now.pending = true;
      setContent(now.content);
      setSaving("typing");
      clearTimeout(timer.current);
      timer.current = setTimeout(() => void save(), PAUSE_MS);
    },
    [save],
  );

  useEffect(() => {
    // What is typed but not yet sent would be lost with the page: the browser asks.
    const ask = (event: BeforeUnloadEvent) => {
      if (latest.current.pending || latest.current.running) event.preventDefault();
    };
    window.addEventListener("beforeunload", ask);
    return () => {
      window.removeEventListener("beforeunload", ask);
      void save();
    };
  }, [save]);

  return { content, change, save, saving, refused, revision };
}
