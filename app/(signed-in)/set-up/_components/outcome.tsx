"use client";

import { Notice } from "@/app/_components/ui";
import { formWords } from "@/lib/strings/set-up";

/** What is left to say after a try to save: why nothing was kept, or that a further save is needed. */
export function Outcome({ failure, keptMine }: { failure: string | null; keptMine: boolean }) {
  if (failure !== null) {
    return (
      <Notice mark="fix" live="alert" className="mb-3">
        {failure}
      </Notice>
    );
  }
  if (!keptMine) return null;
  return (
    <Notice mark="unsaved" live="status" className="mb-3">
      {formWords.keptMine}
    </Notice>
  );
}
