import { Link } from "@/app/_components/ui/link";
import { SectionHead } from "@/app/_components/ui";
import { assignmentWords } from "@/lib/strings/set-up";

interface ChooserProps {
  title: string;
  /** Query parameter that the choice is passed by. */
  side: "ward" | "indicator";
  choices: { code: string; name: string }[];
  /** Assignments by code. */
  counts: ReadonlyMap<string, number>;
  empty: string;
}

/** The wards, or the indicators, as links to their assignments. */
export function Chooser({ title, side, choices, counts, empty }: ChooserProps) {
  return (
    <section>
      <SectionHead>{title}</SectionHead>
      {choices.length === 0 ? <p className="hint">{empty}</p> : null}
      <ul className="ruled-list">
        {choices.map(({ code, name }) => (
          <li key={code}>
            <Link href={`/set-up/assignments?${side}=${code}`}>{name}</Link>{" "}
            <span className="hint">{assignmentWords.reported(counts.get(code) ?? 0)}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
