"use client";

import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { sendForm, type ApiProblem } from "@/app/_hooks/use-api";
import { Button, Field, fieldAria, SectionHead } from "@/app/_components/ui";
import { importPageWords as say } from "@/lib/strings/imports";

const FIELD = { id: "file", label: say.file, hint: say.fileHint };

/** Sends the chosen file to be checked, then shows the check. */
export function UploadForm() {
  const router = useRouter();
  const [error, setError] = useState<string | null>(null);
  const [isChecking, setChecking] = useState(false);

  async function check(event: FormEvent<HTMLFormElement>): Promise<void> {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    const file = form.get("file");
    if (!(file instanceof File) || file.name === "") return setError(say.fileMissing);
    setError(null);
    setChecking(true);
    const sent = await sendForm<{ id: string }>("/api/imports", form);
    if (sent.ok) return router.push(`/imports/${sent.data.id}`);
    setChecking(false);
    setError(wordsOf(sent.problem));
  }

  return (
    <section className="mb-6">
      <SectionHead>{say.chooseTitle}</SectionHead>
      <form className="upload" noValidate method="post" onSubmit={(event) => void check(event)}>
        <Field {...FIELD} error={error}>
          <input
            type="file"
            name="file"
            accept=".xlsx,.csv"
            {...fieldAria({ ...FIELD, error })}
            className="input"
            onChange={() => setError(null)}
          />
        </Field>
        <Button look="primary" type="submit" disabled={isChecking}>
          {isChecking ? say.checking : say.check}
        </Button>
      </form>
    </section>
  );
}

/** What is wrong with the file, each thing once. */
function wordsOf({ detail, errors = [] }: ApiProblem): string {
  return [...new Set([detail, ...errors.map((error) => error.message)])].join(" ");
}
