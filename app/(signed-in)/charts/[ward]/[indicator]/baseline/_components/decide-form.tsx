"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { sendJson } from "@/app/_hooks/use-api";
import { Button, Notice, RadioGroup, TextArea } from "@/app/_components/ui";
import { baselineWords as words } from "@/lib/strings/charts";

interface DecideFormProps {
  ward: string;
  indicator: string;
  id: string;
  version: number;
}

interface DecideValues {
  decision: "agree" | "decline";
  reason: string;
}

/** The second person's part: agree, or leave the limits as they are. */
export function DecideForm({ ward, indicator, id, version }: DecideFormProps) {
  const router = useRouter();
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm<DecideValues>({ defaultValues: { decision: "agree", reason: "" } });

  async function decide({ decision, reason }: DecideValues) {
    setFailure(null);
    const body = { id, version, agree: decision === "agree", reason };
    const sent = await sendJson("POST", `/api/baselines/${ward}/${indicator}/decision`, body);
    if (!sent.ok) return setFailure(sent.problem.detail);
    router.push(`/charts/${ward}/${indicator}/baseline`);
    router.refresh();
  }

  return (
    <form
      className="mt-3"
      noValidate
      method="post"
      onSubmit={(event) => void form.handleSubmit(decide)(event)}
    >
      <RadioGroup
        id="decision"
        label={words.decide}
        {...splitRegister(form.register("decision"))}
        options={[
          { value: "agree", label: words.agree, detail: words.agreeNote },
          { value: "decline", label: words.decline, detail: words.declineNote },
        ]}
      />
      <TextArea id="decision-reason" label={words.why} maxLength={500} {...form.register("reason")} />
      {failure ? (
        <Notice mark="fix" live="alert" className="mb-3">
          {failure}
        </Notice>
      ) : null}
      <Button look="primary" type="submit" disabled={form.formState.isSubmitting}>
        {words.record}
      </Button>
    </form>
  );
}

/** The group takes the name apart from the rest of a registration. */
function splitRegister<Input extends { name: string }>({ name, ...input }: Input) {
  return { name, input };
}
