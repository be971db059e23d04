import { SectionHead } from "@/app/_components/ui";
import type { AssignmentReply } from "@/lib/schemas/assignment";
import { assignmentWords } from "@/lib/strings/set-up";
import { AssignmentRow } from "./assignment-row";

export interface AssignmentLine {
  ward: { code: string; name: string; openFrom: string; openTo: string | null };
  indicator: { code: string; name: string };
  assignment: AssignmentReply | null;
}

interface AssignmentListProps {
  title: string;
  note?: string;
  /** Which side each row is named by. */
  rowsAre: "wards" | "indicators";
  lines: AssignmentLine[];
}

/** All pairs of one ward, or of one indicator, assigned or not. */
export function AssignmentList({ title, note, rowsAre, lines }: AssignmentListProps) {
  return (
    <section aria-labelledby="assignment-list">
      <SectionHead id="assignment-list" note={note}>
        {title}
      </SectionHead>
      <p className="hint mb-3">{assignmentWords.endHint}</p>
      <ul className="assignment-rows">
        {lines.map(({ ward, indicator, assignment }) => {
          const named = rowsAre === "wards" ? ward : indicator;
          return (
            <AssignmentRow
              key={`${ward.code} ${indicator.code} ${assignment?.version ?? 0}`}
              ward={ward.code}
              indicator={indicator.code}
              name={named.name}
              note={named.code}
              assignment={assignment}
              open={{ from: ward.openFrom, to: ward.openTo }}
            />
          );
        })}
      </ul>
    </section>
  );
}
