import { Mark } from "@/app/_components/ui";
import type { ImportReply } from "@/lib/schemas/import";
import { checkPageWords as say } from "@/lib/strings/imports";
import { CommitForm } from "./commit-form";

/** What there is to know before the sheet is brought in, and the button. */
export function BeforePanel({ run, mayAccept }: { run: ImportReply; mayAccept: boolean }) {
  const { counts } = run;
  const isFine = counts.rejected === 0 && counts.changed === 0 && !run.needsReason;
  const isSame = counts.new + counts.changed + counts.rejected === 0;
  return (
    <section className="panel mb-4" aria-labelledby="before">
      <h2 id="before">{say.panelTitle}</h2>
      <ul className="ruled-list mb-3">
        {counts.rejected > 0 ? (
          <li className="mark-line">
            <Mark mark="fix" size={15} />
            <div>
              <b>{say.needFixing(counts.rejected)}</b> {say.needFixingNext}
            </div>
          </li>
        ) : null}
        {run.needsReason ? (
          <li className="mark-line">
            <Mark mark="corrected" size={15} />
            <div>
              <b>{say.replaceSent}</b> {say.replaceSentNext}
            </div>
          </li>
        ) : null}
        {counts.changed > 0 && !run.needsReason ? (
          <li className="mark-line">
            <Mark mark="corrected" size={15} />
            <b>{say.replace(counts.changed)}</b>
          </li>
        ) : null}
        {counts.skipped > 0 ? <li>{say.skipped(counts.skipped, run.skippedRows.join(", "))}</li> : null}
        {isFine ? <li>{isSame ? say.nothingToDo : say.allFine}</li> : null}
      </ul>
      <CommitForm
        id={run.id}
        rejected={counts.rejected}
        rest={counts.new + counts.changed + counts.same}
        needsReason={run.needsReason}
        mayAccept={mayAccept}
      />
    </section>
  );
}
