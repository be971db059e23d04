"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { Button, ButtonLink, TextInput } from "@/app/_components/ui";
import { createWardSchema, updateWardSchema, wardSchema, type WardReply } from "@/lib/schemas/ward";
import { formWords, wardWords } from "@/lib/strings/set-up";
import { Outcome } from "../../_components/outcome";
import { routeResolver } from "../../_components/route-resolver";
import { TwoVersions } from "../../_components/two-versions";
import { useSending } from "../../_components/use-sending";

interface WardFormValues {
  code?: string;
  name: string;
  division: string;
  openFrom: string;
  openTo: string | null;
  version?: number;
}

const fields = ["code", "name", "division", "openFrom", "openTo"] as const;
const labels = {
  name: wardWords.name,
  division: wardWords.division,
  openFrom: wardWords.openFrom,
  openTo: wardWords.openTo,
} as const;

const blank: WardFormValues = { code: "", name: "", division: "", openFrom: "", openTo: null };
const blankAsNull = { setValueAs: (value: string | null) => value || null };

/** A ward to add, or one to change. */
export function WardForm({ ward }: { ward: WardReply | null }) {
  const router = useRouter();
  const form = useForm<WardFormValues>({
    resolver: routeResolver(ward ? updateWardSchema : createWardSchema),
    defaultValues: ward ?? blank,
  });
  const { errors, isSubmitting } = form.formState;
  const { send, outcome, newer, settle } = useSending(form.setError, fields);

  async function save(values: WardFormValues) {
    const kept = ward
      ? await send("PATCH", `/api/wards/${ward.code}`, values)
      : await send("POST", "/api/wards", values);
    if (!kept) return;
    router.push("/set-up/wards");
    router.refresh();
  }

  function resolve(useTheirs: boolean) {
    const theirs = wardSchema.parse(newer);
    if (useTheirs) form.reset(theirs);
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
      {ward ? null : (
        <TextInput
          id="code"
          label={wardWords.code}
          hint={wardWords.codeHint}
          error={errors.code?.message}
          autoCapitalize="characters"
          {...form.register("code")}
        />
      )}
      <TextInput id="name" label={wardWords.name} error={errors.name?.message} {...form.register("name")} />
      <TextInput
        id="division"
        label={wardWords.division}
        hint={wardWords.divisionHint}
        error={errors.division?.message}
        {...form.register("division")}
      />
      <div className="form-pair">
        <TextInput
          id="openFrom"
          type="month"
          label={wardWords.openFrom}
          hint={formWords.monthHint}
          error={errors.openFrom?.message}
          {...form.register("openFrom")}
        />
        <TextInput
          id="openTo"
          type="month"
          label={wardWords.openTo}
          hint={formWords.openEnd}
          error={errors.openTo?.message}
          {...form.register("openTo", blankAsNull)}
        />
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
      <div className="actions">
        <Button look="primary" type="submit" disabled={isSubmitting}>
          {isSubmitting ? formWords.saving : ward ? formWords.save : wardWords.add}
        </Button>
        <ButtonLink href="/set-up/wards">{formWords.cancel}</ButtonLink>
      </div>
    </form>
  );
}
