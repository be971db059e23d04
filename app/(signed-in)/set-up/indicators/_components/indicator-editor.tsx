"use client";

import { useRouter } from "next/navigation";
import { useState, type ReactNode } from "react";
import { useForm, useWatch } from "react-hook-form";
import { Button, ButtonLink, SectionHead } from "@/app/_components/ui";
import { defaultRules } from "@/lib/indicators/vocabulary";
import {
  createIndicatorSchema,
  indicatorSchema,
  updateIndicatorSchema,
  type IndicatorReply,
} from "@/lib/schemas/indicator";
import { indicatorWords } from "@/lib/strings/indicator-set-up";
import { formWords } from "@/lib/strings/set-up";
import { Outcome } from "../../_components/outcome";
import { routeResolver } from "../../_components/route-resolver";
import { TwoVersions } from "../../_components/two-versions";
import { useSending } from "../../_components/use-sending";
import { AsRead } from "./as-read";
import { DefinitionFields } from "./definition-fields";
import { changesWords, formFields, formLabels, formSchema, formValues, toBody } from "./indicator-form";
import { RulesFields } from "./rules-fields";
import { ShownFields } from "./shown-fields";
import { VersionFields } from "./version-fields";

interface IndicatorEditorProps {
  /** Null for a new one. */
  indicator: IndicatorReply | null;
  isCounted: boolean;
  sharedCodes: string[];
  /** Beside the form, above the preview. */
  aside?: ReactNode;
}

/** An indicator to add, or one to change: new words of its definition become a version from a month on. */
export function IndicatorEditor({ indicator: loaded, isCounted, sharedCodes, aside }: IndicatorEditorProps) {
  const router = useRouter();
  const [indicator, setIndicator] = useState(loaded);
  const schema = formSchema(indicator ? updateIndicatorSchema : createIndicatorSchema, indicator);
  const form = useForm({
    resolver: routeResolver<ReturnType<typeof formValues>>(schema),
    defaultValues: formValues(indicator, defaultRules),
  });
  const { errors, isSubmitting } = form.formState;
  const { send, outcome, newer, settle } = useSending(form.setError, formFields);
  const [numeratorLabel, denominatorLabel, attribution] = useWatch({
    control: form.control,
    name: ["numeratorLabel", "denominatorLabel", "attribution"],
  });
  const hasNewWords =
    indicator !== null && changesWords({ numeratorLabel, denominatorLabel, attribution }, indicator);
  const nextNumber = hasNewWords ? indicator.definitions.length + 1 : null;
  const fields = { register: form.register, errors, isNew: indicator === null, isCounted };

  async function save() {
    const body = toBody(form.getValues(), indicator);
    const kept = indicator
      ? await send("PATCH", `/api/indicators/${indicator.code}`, body)
      : await send("POST", "/api/indicators", body);
    if (!kept) return;
    router.push("/set-up/indicators");
    router.refresh();
  }

  function resolve(useTheirs: boolean) {
    const theirs = indicatorSchema.parse(newer);
    setIndicator(theirs);
    if (useTheirs) form.reset(formValues(theirs, defaultRules));
    form.setValue("version", theirs.version);
    settle(useTheirs);
  }

  return (
    <form
      className="with-aside"
      noValidate
      method="post"
      onSubmit={(event) => void form.handleSubmit(save)(event)}
    >
      <div>
        <SectionHead note={indicator ? indicatorWords.definitionNote : undefined}>
          {indicatorWords.definition}
        </SectionHead>
        <DefinitionFields {...fields} />
        <ShownFields {...fields} per={indicator?.per ?? null} sharedCodes={sharedCodes} />
        <SectionHead id="rules-and-limits" note={indicator ? indicatorWords.limitsNote : undefined}>
          {indicatorWords.limitsAndRules}
        </SectionHead>
        <RulesFields {...fields} />
        {indicator ? <VersionFields {...fields} number={nextNumber} /> : null}
        {newer ? (
          <TwoVersions
            labels={formLabels}
            mine={{ ...form.getValues() }}
            theirs={{ ...formValues(indicatorSchema.parse(newer), defaultRules) }}
            onKeepMine={() => resolve(false)}
            onUseTheirs={() => resolve(true)}
          />
        ) : null}
        <Outcome {...outcome} />
        <div className="actions">
          <Button look="primary" type="submit" disabled={isSubmitting}>
            {isSubmitting ? formWords.saving : saveWords(indicator, nextNumber)}
          </Button>
          <ButtonLink href="/set-up/indicators">{formWords.cancel}</ButtonLink>
        </div>
      </div>
      <div>
        {aside}
        <AsRead control={form.control} />
      </div>
    </form>
  );
}

function saveWords(indicator: IndicatorReply | null, nextNumber: number | null): string {
  if (indicator === null) return indicatorWords.create;
  return nextNumber === null ? formWords.save : indicatorWords.saveVersion(nextNumber);
}
