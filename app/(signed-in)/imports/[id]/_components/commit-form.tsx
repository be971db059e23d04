"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { problemForForm, sendJson, type ApiProblem } from "@/app/_hooks/use-api";
import { Button, Checkbox, TextArea } from "@/app/_components/ui";
import { commitImportSchema, type CommitImport } from "@/lib/schemas/import";
import { checkPageWords as say } from "@/lib/strings/imports";
import { ProblemList } from "../../_components/problem-list";

interface CommitFormProps {
  id: string;
  rejected: number;
  /** Rows that can be brought in. */
  rest: number;
  needsReason: boolean;
  mayAccept: boolean;
}

/** Brings the sheet in; rows that need fixing are left out by the words of the button. */
export function CommitForm({ id, rejected, rest, needsReason, mayAccept }: CommitFormProps) {
  const router = useRouter();
  const [problem, setProblem] = useState<ApiProblem | null>(null);
  const { register, handleSubmit, setError, formState } = useForm<CommitImport>({
    resolver: zodResolver(commitImportSchema),
    defaultValues: needsReason ? { reason: "" } : {},
  });

  async function bringIn(values: CommitImport): Promise<void> {
    setProblem(null);
    const body = { ...values, leaveOutRejected: rejected > 0 };
    const sent = await sendJson("POST", `/api/imports/${id}/commit`, body);
    if (sent.ok) return router.refresh();
    const { fieldErrors, rest: others } = problemForForm(sent.problem, ["reason"]);
    for (const { name, message } of fieldErrors) setError(name, { message });
    if (others !== null) setProblem(sent.problem);
  }

  return (
    <form noValidate method="post" onSubmit={(event) => void handleSubmit(bringIn)(event)}>
      {needsReason ? (
        <TextArea
          id="reason"
          label={say.reason}
          error={formState.errors.reason?.message}
          {...register("reason")}
        />
      ) : null}
      {mayAccept ? <Checkbox label={say.accept} detail={say.acceptDetail} {...register("accept")} /> : null}
      {problem ? <ProblemList problem={problem} /> : null}
      <div className="stacked">
        <Button look="primary" type="submit" disabled={formState.isSubmitting || rest === 0}>
          {formState.isSubmitting
            ? say.bringingIn
            : rejected > 0
              ? say.leaveOut(rejected, rest)
              : say.bringIn(rest)}
        </Button>
      </div>
    </form>
  );
}
