import { Link } from "@/app/_components/ui/link";
import { Mark, Notice, PageHead } from "@/app/_components/ui";
import { inWords } from "@/lib/indicators/chart-format";
import { dayInWords, instantInWords, monthAlone } from "@/lib/indicators/return-dates";
import type { ReturnSteps } from "@/lib/indicators/return-entry";
import type { CorrectionReply } from "@/lib/schemas/correction";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import type { SentLine } from "@/lib/services/returns";
import { entryWords } from "@/lib/strings/returns";
import { sentPageWords as say } from "@/lib/strings/sent-return";
import { SentSteps } from "./return-steps";
import { SentTable } from "./sent-table";

interface SentReturnProps {
  wardReturn: WardReturnReply;
  lines: SentLine[];
  /** Corrections of this return that wait for a decision. */
  waiting: CorrectionReply[];
  may: ReturnSteps;
  timeZone: string;
}

/** A sent return: what it shows, line by line, and what may be done with it. */
export function SentReturn({ wardReturn, lines, waiting, may, timeZone }: SentReturnProps) {
  const month = monthAlone(wardReturn.month);
  const isAccepted = wardReturn.status === "accepted";
  return (
    <>
      <PageHead
        crumbs={[
          { label: entryWords.crumb, href: "/returns" },
          { label: entryWords.division(wardReturn.wardName, wardReturn.division) },
        ]}
        title={isAccepted ? say.acceptedTitle(month) : say.title(month)}
        subtitle={<SentWhen wardReturn={wardReturn} timeZone={timeZone} />}
        actions={<SentSteps wardReturn={wardReturn} may={may} />}
      />
      <Standout lines={lines} />
      {waiting.length > 0 ? (
        <Notice mark="corrected" className="mb-3" title={say.waiting(waiting.length)}>
          {waiting.map((correction, index) => (
            <span key={correction.id}>
              {index > 0 ? ", " : null}
              <Link href={`/returns/${correction.ward}/${correction.month}/${correction.indicator}`}>
                {correction.indicatorName}
              </Link>
            </span>
          ))}
        </Notice>
      ) : null}
      <SentTable wardReturn={wardReturn} lines={lines} may={may} />
      <p className="hint mt-2">{say.legend}</p>
    </>
  );
}

function SentWhen({ wardReturn, timeZone }: Pick<SentReturnProps, "wardReturn" | "timeZone">) {
  const { wardName, submittedBy, submittedAt, acceptedBy, acceptedAt, dueOn, late } = wardReturn;
  return (
    <>
      {submittedAt
        ? say.sentBy(wardName, submittedBy ?? "", instantInWords(submittedAt, timeZone))
        : wardName}{" "}
      {late ? (
        <>
          <Mark mark="late" /> {say.late(dayInWords(dueOn))}
        </>
      ) : (
        say.inTime(dayInWords(dueOn))
      )}{" "}
      {acceptedAt ? say.acceptedBy(acceptedBy ?? "", instantInWords(acceptedAt, timeZone)) : null}
    </>
  );
}

/** The signals first, in one sentence. */
function Standout({ lines }: { lines: readonly SentLine[] }) {
  const signals = lines.filter((line) => line.saying.isSignal);
  const [first] = signals;
  const names = inWords(signals.map((line) => line.name));
  return (
    <p className="mark-line mb-3">
      {first?.saying.mark ? <Mark mark={first.saying.mark} /> : null}
      <b>
        {signals.length === 0 ? say.noneStandsOut : null}
        {signals.length === 1 ? say.oneStandsOut(names) : null}
        {signals.length > 1 ? say.standOut(names, signals.length) : null}
      </b>
    </p>
  );
}
