"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { sendJson, type ApiProblem } from "@/app/_hooks/use-api";
import { Button } from "@/app/_components/ui";
import { Dialog } from "@/app/_components/ui/dialog";
import { importPageWords as say } from "@/lib/strings/imports";
import { ProblemList } from "./problem-list";

/** Undoes a whole import after a second question. */
export function TakeBack({ id, rows }: { id: string; rows: number }) {
  const router = useRouter();
  const [isAsking, setAsking] = useState(false);
  const [isSending, setSending] = useState(false);
  const [problem, setProblem] = useState<ApiProblem | null>(null);

  async function takeBack(): Promise<void> {
    setSending(true);
    setProblem(null);
    const sent = await sendJson("DELETE", `/api/imports/${id}`);
    setSending(false);
    if (!sent.ok) return setProblem(sent.problem);
    setAsking(false);
    router.refresh();
  }

  return (
    <>
      <Button look="text" onClick={() => setAsking(true)}>
        {say.takeBack}
      </Button>
      <Dialog open={isAsking} title={say.takeBack} onClose={() => setAsking(false)}>
        <p className="mb-3">{say.takeBackSure(rows)}</p>
        {problem ? <ProblemList problem={problem} /> : null}
        <div className="actions">
          <Button look="primary" onClick={() => void takeBack()} disabled={isSending}>
            {isSending ? say.takingBack : say.takeBackYes}
          </Button>
          <Button onClick={() => setAsking(false)}>{say.keep}</Button>
        </div>
      </Dialog>
    </>
  );
}
