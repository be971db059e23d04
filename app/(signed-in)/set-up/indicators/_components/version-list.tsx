import { SectionHead } from "@/app/_components/ui";
import { longDate, longMonth } from "@/lib/indicators/chart-format";
import { FROM_THE_BEGINNING } from "@/lib/indicators/definition";
import type { Month } from "@/lib/indicators/month";
import type { IndicatorReply } from "@/lib/schemas/indicator";
import { indicatorWords } from "@/lib/strings/indicator-set-up";

/** Versions of the definition, newest first; one that isn't in force yet has a broken outline. */
export function VersionList({
  definitions,
  thisMonth,
}: {
  definitions: IndicatorReply["definitions"];
  thisMonth: Month;
}) {
  return (
    <section>
      <SectionHead>{indicatorWords.versions}</SectionHead>
      <ol className="versions" reversed>
        {definitions.toReversed().map((version) => (
          <li key={version.number} className={version.effectiveFrom > thisMonth ? "coming" : undefined}>
            <span className="number">{version.number}</span>
            <span>
              <b>{fromWords(version.effectiveFrom)}</b>
              {version.number === 1 ? null : `, ${comparison(version)}`}
              <span className="hint">
                {indicatorWords.versionReason(
                  version.reason,
                  version.decidedBy,
                  longDate(version.decidedAt.slice(0, 10)),
                )}
              </span>
            </span>
          </li>
        ))}
      </ol>
    </section>
  );
}

function fromWords(month: Month): string {
  return month === FROM_THE_BEGINNING ? indicatorWords.fromBeginning : indicatorWords.from(longMonth(month));
}

function comparison({ comparable, number }: { comparable: boolean; number: number }): string {
  return comparable ? indicatorWords.comparableWith(number - 1) : indicatorWords.notComparableShort;
}
