"use client";

import { Problem } from "@/lib/client/fetch-json";
import { Button } from "./button";
import { Notice } from "./notice";

type Props = {
  /** What was thrown or refused. Anything that is no `Problem` reads as a fault of ours, without its inner words. */
  problem: unknown;
  /** What could not be done, such as "The footings could not be read". */
  title?: string;
  /** Fields whose sentence already stands beside them; the others are said here. */
  fieldsShown?: readonly string[];
  onRetry?: () => void;
  className?: string;
};

/** Says what went wrong in the server's own sentence, and offers another try where that can help. Shows nothing for null. */
export function ErrorNote({ problem, title, fieldsShown = [], onRetry, className }: Props) {
  if (problem === null || problem === undefined) return null;
  const known = problem instanceof Problem;
  const others = known ? Object.entries(problem.fields).filter(([name]) => !fieldsShown.includes(name)) : [];
  return (
    <Notice
      kind="refused"
      title={title}
      className={className}
      action={onRetry && <Button onClick={onRetry}>Try again</Button>}
    >
      <p>{known ? problem.detail : "Something went wrong on our side. Nothing was changed."}</p>
      {others.length > 0 && (
        <ul className="mt-1 list-disc pl-5">
          {others.map(([name, sentence]) => (
            <li key={name}>{sentence}</li>
          ))}
        </ul>
      )}
    </Notice>
  );
}
