"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { Button, NamedMark, TextInput } from "@/app/_components/ui";
import { assignmentSchema, setAssignmentSchema, type AssignmentReply } from "@/lib/schemas/assignment";
import { assignmentWords, formWords } from "@/lib/strings/set-up";
import { Outcome } from "../../_components/outcome";
import { routeResolver } from "../../_components/route-resolver";
import { TwoVersions } from "../../_components/two-versions";
import { useSending } from "../../_components/use-sending";

interface AssignmentRowProps {
  ward: string;
  indicator: string;
  /** The other side of the page: an indicator on a ward's page, a ward on an indicator's. */
  name: string;
  note: string;
  assignment: AssignmentReply | null;
  open: { from: string; to: string | null };
}

interface AssignmentValues {
  from: string;
  to: string | null;
  version: number;
}

const labels = { from: assignmentWords.from, to: assignmentWords.to } as const;
const blankAsNull = { setValueAs: (value: string | null) => value || null };

/** One ward and one indicator: the months, kept by a button of its own. */
export function AssignmentRow({ ward, indicator, name, note, assignment, open }: AssignmentRowProps) {
  const router = useRouter();
  const [isSaved, setSaved] = useState(false);
  const form = useForm<AssignmentValues>({
    resolver: routeResolver(setAssignmentSchema),
    defaultValues: valuesOf(assignment),
  });
  const { errors, isSubmitting } = form.formState;
  const { send, outcome, newer, settle } = useSending(form.setError, ["from", "to"]);
  const id = `${ward}-${indicator}`;

  async function save(values: AssignmentValues) {
    setSaved(false);
    if (!(await send("PUT", `/api/assignments/${ward}/${indicator}`, values))) return;
    setSaved(true);
    router.refresh();
  }

  function resolve(useTheirs: boolean) {
    const theirs = valuesOf(assignmentSchema.parse(newer));
    if (useTheirs) form.reset(theirs);
    form.setValue("version", theirs.version);
    settle(useTheirs);
  }

  const months = { type: "month", min: open.from, max: open.to ?? undefined } as const;
  return (
    <li>
      <form noValidate method="post" onSubmit={(event) => void form.handleSubmit(save)(event)}>
        <div className="assignment-row">
          <div>
            <b>{name}</b>
            <span className="hint">{assignment ? note : `${note}, ${assignmentWords.notCounted}`}</span>
          </div>
          <TextInput
            id={`from-${id}`}
            label={assignmentWords.from}
            error={errors.from?.message}
            {...months}
            {...form.register("from")}
          />
          <TextInput
            id={`to-${id}`}
            label={assignmentWords.to}
            error={errors.to?.message}
            {...months}
            {...form.register("to", blankAsNull)}
          />
          <div className="actions">
            <Button
              type="submit"
              disabled={isSubmitting}
              aria-label={assignment ? assignmentWords.changeOf(name) : assignmentWords.assignTo(name)}
            >
              {isSubmitting ? formWords.saving : assignment ? assignmentWords.change : assignmentWords.assign}
            </Button>
            <span role="status">{isSaved ? <NamedMark mark="saved" name={formWords.saved} /> : null}</span>
          </div>
        </div>
        {newer ? (
          <TwoVersions
            labels={labels}
            mine={{ ...form.getValues() }}
            theirs={newer}
            onKeepMine={() => resolve(false)}
            onUseTheirs={() => resolve(true)}
          />
        ) : null}
        <Outcome {...outcome} />
      </form>
    </li>
  );
}

function valuesOf(assignment: AssignmentReply | null): AssignmentValues {
  return { from: assignment?.from ?? "", to: assignment?.to ?? null, version: assignment?.version ?? 0 };
}
