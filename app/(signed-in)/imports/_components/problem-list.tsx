"use client";

import type { ApiProblem } from "@/app/_hooks/use-api";
import { Notice } from "@/app/_components/ui";

/** Why nothing was changed, with the rows that stand in the way. */
export function ProblemList({ problem }: { problem: ApiProblem }) {
  const lines = (problem.errors ?? []).filter((error) => error.message !== problem.detail);
  return (
    <Notice mark="fix" live="alert" className="mb-3">
      {problem.detail}
      {lines.length > 0 ? (
        <ul>
          {lines.map((error) => (
            <li key={error.path}>{error.message}</li>
          ))}
        </ul>
      ) : null}
    </Notice>
  );
}
