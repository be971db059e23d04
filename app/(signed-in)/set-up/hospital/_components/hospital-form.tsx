"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { Button, TextArea, TextInput } from "@/app/_components/ui";
import { hospitalSchema, updateHospitalSchema, type HospitalRecord } from "@/lib/schemas/hospital";
import { formWords, hospitalWords } from "@/lib/strings/set-up";
import { Outcome } from "../../_components/outcome";
import { routeResolver } from "../../_components/route-resolver";
import { TwoVersions } from "../../_components/two-versions";
import { useSending } from "../../_components/use-sending";

interface HospitalFormValues {
  name: string;
  timeZone: string;
  dueDay: number;
  /** Lines of text in the box; a list once read. */
  holidays: string | string[];
  version: number;
}

const fields = ["name", "timeZone", "dueDay", "holidays"] as const;
const labels = {
  name: hospitalWords.name,
  timeZone: hospitalWords.timeZone,
  dueDay: hospitalWords.dueDay,
  holidays: hospitalWords.holidays,
} as const;

/** One date a line in the box, a list in the form. */
const asLines = {
  setValueAs: (value: string | string[]) =>
    typeof value === "string" ? value.split(/[\s,]+/).filter((date) => date !== "") : value,
};
/** A blank box is not the day zero. */
const asDay = { setValueAs: (value: string | number) => (value === "" ? null : Number(value)) };

/** A list's error stands at the list or at one of its dates. */
function firstMessage(error: unknown): string | undefined {
  if (Array.isArray(error)) return error.map(firstMessage).find((message) => message !== undefined);
  if (typeof error !== "object" || error === null || !("message" in error)) return undefined;
  return typeof error.message === "string" ? error.message : undefined;
}

/** What is set for the whole hospital. */
export function HospitalForm({ hospital }: { hospital: HospitalRecord }) {
  const router = useRouter();
  const form = useForm<HospitalFormValues>({
    resolver: routeResolver(updateHospitalSchema),
    defaultValues: { ...hospital, holidays: hospital.holidays.join("\n") },
  });
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState;
  const { send, outcome, newer, settle } = useSending(form.setError, fields);

  async function save(values: HospitalFormValues) {
    if (await send("PATCH", "/api/hospital", values)) router.refresh();
  }

  function resolve(useTheirs: boolean) {
    const theirs = hospitalSchema.parse(newer);
    if (useTheirs) form.reset({ ...theirs, holidays: theirs.holidays.join("\n") });
    form.setValue("version", theirs.version);
    settle(useTheirs);
  }

  return (
    <form
      className="form-narrow"
      noValidate
      method="post"
      onSubmit={(event) => void form.handleSubmit(save)(event)}
    >
      <TextInput id="name" label={labels.name} error={errors.name?.message} {...form.register("name")} />
      <div className="form-pair">
        <TextInput
          id="timeZone"
          label={labels.timeZone}
          hint={hospitalWords.timeZoneHint}
          error={errors.timeZone?.message}
          {...form.register("timeZone")}
        />
        <TextInput
          id="dueDay"
          inputMode="numeric"
          label={labels.dueDay}
          hint={hospitalWords.dueDayHint}
          error={errors.dueDay?.message}
          {...form.register("dueDay", asDay)}
        />
      </div>
      <TextArea
        id="holidays"
        label={labels.holidays}
        hint={hospitalWords.holidaysHint}
        error={firstMessage(errors.holidays)}
        rows={6}
        {...form.register("holidays", asLines)}
      />
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
      <div className="actions">
        <Button look="primary" type="submit" disabled={isSubmitting}>
          {isSubmitting ? formWords.saving : formWords.save}
        </Button>
        <span role="status">{isSubmitSuccessful && !outcome.failure && !newer ? formWords.saved : ""}</span>
      </div>
    </form>
  );
}
