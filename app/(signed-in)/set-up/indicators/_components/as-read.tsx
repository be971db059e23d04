"use client";

import { useWatch, type Control } from "react-hook-form";
import { SectionHead } from "@/app/_components/ui";
import { perWords } from "@/lib/indicators/chart-format";
import { indicatorWords } from "@/lib/strings/indicator-set-up";
import type { IndicatorFormValues } from "./indicator-form";

/** The line of the return as typed so far. */
export function AsRead({ control }: { control: Control<IndicatorFormValues> }) {
  const [name, per, numerator, denominator] = useWatch({
    control,
    name: ["name", "per", "numeratorLabel", "denominatorLabel"],
  });
  return (
    <section className="mt-4">
      <SectionHead>{indicatorWords.asRead}</SectionHead>
      <div className="panel">
        <b>{name}</b>
        <div className="hint">{perWords(Number(per))}</div>
        <div className="as-read">
          <span>{numerator}</span>
          <span className="blank" aria-hidden="true" />
          <span>{denominator}</span>
          <span className="blank" aria-hidden="true" />
        </div>
      </div>
    </section>
  );
}
