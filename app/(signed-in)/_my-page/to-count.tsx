import { Link } from "@/app/_components/ui/link";
import { Mark, SectionHead } from "@/app/_components/ui";
import { monthAlone } from "@/lib/indicators/return-dates";
import type { TeamLine } from "@/lib/services/returns";
import { myPageWords as say } from "@/lib/strings/my-page";

/** Lines of open returns that the reader's team counts. */
export function ToCount({ team, lines }: { team: string; lines: readonly TeamLine[] }) {
  return (
    <section>
      <SectionHead>{say.toCount(team)}</SectionHead>
      {lines.length === 0 ? <p>{say.noneToCount}</p> : null}
      <ul className="ruled-list">
        {lines.map((line) => (
          <li key={`${line.ward} ${line.month} ${line.indicator}`} className="mark-line">
            <Mark mark={line.isCounted ? "saved" : "unsaved"} />
            <div>
              <Link href={`/returns/${line.ward}/${line.month}`}>{line.wardName}</Link>,{" "}
              {say.line(line.indicatorName, monthAlone(line.month))}:{" "}
              {line.isCounted ? say.counted : say.notCounted}
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
