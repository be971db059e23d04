import { Notice } from "@/app/_components/ui";
import type { ImportReply } from "@/lib/schemas/import";
import { checkPageWords as say } from "@/lib/strings/imports";
import { TakeBack } from "../../_components/take-back";

/** What became of the sheet. */
export function AfterPanel({ run }: { run: ImportReply }) {
  const broughtIn = run.counts.new + run.counts.changed;
  return (
    <section className="panel mb-4" aria-labelledby="after">
      <h2 id="after">{say.broughtInTitle}</h2>
      <Notice mark="saved" live="status" className="mb-3">
        {say.broughtIn(broughtIn, run.counts.rejected)} {run.accepted ? say.accepted : null}
      </Notice>
      {run.reason ? <p className="mb-3">{say.reasonGiven(run.reason)}</p> : null}
      {run.state === "committed" ? <TakeBack id={run.id} rows={broughtIn} /> : <p>{say.takenBack}</p>}
    </section>
  );
}
