import { Sayings } from "@/app/_components/chart/sayings";
import { readingStripWords } from "@/lib/strings/chart";
import type { MonthReading } from "@/lib/scene/reading";
import type { ReactNode } from "react";

export interface ReadingStripProps {
  reading: MonthReading;
  numeratorLabel: string;
  denominatorLabel: string;
  /** In place of the bare month: a link that opens it. */
  monthLink?: ReactNode;
}

/** One month's figures along the top of the chart, in place of a box over the record. */
export function ReadingStrip({ reading, numeratorLabel, denominatorLabel, monthLink }: ReadingStripProps) {
  return (
    <dl className="reading-strip" aria-live="polite" aria-atomic="true">
      <div className="reading-month">
        <dt className="sr-only">{readingStripWords.month}</dt>
        <dd>{monthLink ?? reading.month}</dd>
      </div>
      <Figure label={numeratorLabel}>{reading.numerator}</Figure>
      <Figure label={denominatorLabel}>{reading.denominator}</Figure>
      <Figure label={readingStripWords.rate} workedOut>
        {reading.rate}
      </Figure>
      <Figure label={readingStripWords.actionLimits} workedOut>
        {reading.actionLimits}
      </Figure>
      <Figure label={readingStripWords.warningLimits} workedOut>
        {reading.warningLimits}
      </Figure>
      <div className="reading-says">
        <dt className="sr-only">{readingStripWords.says}</dt>
        <dd>
          <Sayings says={reading.says} />
        </dd>
      </div>
    </dl>
  );
}

function Figure({ label, workedOut, children }: { label: string; workedOut?: boolean; children: ReactNode }) {
  return (
    <div>
      <dt>{label}</dt>
      <dd className={workedOut ? "worked-out" : undefined}>{children}</dd>
    </div>
  );
}
