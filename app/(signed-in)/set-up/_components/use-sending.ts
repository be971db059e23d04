"use client";

import { useState } from "react";
import type { FieldValues, Path, UseFormSetError } from "react-hook-form";
import { problemForForm, sendJson, type ApiProblem } from "@/app/_hooks/use-api";

export type SavedRecord = Record<string, unknown>;

/** How a set-up form sends: what went wrong lands at its field, above the form, or as two versions of one record. */
export function useSending<Values extends FieldValues>(
  setError: UseFormSetError<Values>,
  fields: readonly Path<Values>[],
) {
  const [failure, setFailure] = useState<string | null>(null);
  const [newer, setNewer] = useState<SavedRecord | null>(null);
  const [keptMine, setKeptMine] = useState(false);

  function show(problem: ApiProblem): void {
    if (problem.type === "/problems/stale" && isRecord(problem.current)) return setNewer(problem.current);
    const { fieldErrors, rest } = problemForForm(problem, fields);
    fieldErrors.forEach(({ name, message }, index) =>
      setError(name, { message }, { shouldFocus: index === 0 }),
    );
    setFailure(rest);
  }

  /** True where the change was kept. */
  async function send(method: "POST" | "PUT" | "PATCH", url: string, body: unknown): Promise<boolean> {
    setFailure(null);
    setNewer(null);
    setKeptMine(false);
    const sent = await sendJson(method, url, body);
    if (!sent.ok) show(sent.problem);
    return sent.ok;
  }

  /** After the choice between two versions. */
  function settle(useTheirs: boolean): void {
    setNewer(null);
    setKeptMine(!useTheirs);
  }

  return { send, outcome: { failure, keptMine }, newer, settle };
}

function isRecord(value: unknown): value is SavedRecord {
  return typeof value === "object" && value !== null;
}
