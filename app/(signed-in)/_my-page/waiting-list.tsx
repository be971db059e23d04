import { ButtonLink, Cell, DataRow, DataTable, HeadCell, Mark } from "@/app/_components/ui";
import type { MarkId } from "@/lib/strings/frame";
import { myPageWords as say } from "@/lib/strings/my-page";

/** One thing that waits for somebody: what, by when, and the step. */
export interface WaitingThing {
  key: string;
  mark: MarkId | null;
  what: string;
  detail: string;
  /** In words; null where there is no day. */
  due: string | null;
  step: { label: string; href: string };
  isFirst?: boolean;
}

export function WaitingList({ things }: { things: readonly WaitingThing[] }) {
  if (things.length === 0) return null;
  return (
    <DataTable caption={say.waits} look="roomy" className="waiting-list">
      <thead>
        <tr>
          <HeadCell className="waiting-mark">
            <span className="sr-only">{say.mark}</span>
          </HeadCell>
          <HeadCell>{say.what}</HeadCell>
          <HeadCell>{say.due}</HeadCell>
          <HeadCell>
            <span className="sr-only">{say.step}</span>
          </HeadCell>
        </tr>
      </thead>
      <tbody>
        {things.map((thing) => (
          <DataRow key={thing.key}>
            <Cell className="waiting-mark">
              {thing.mark ? <Mark mark={thing.mark} size={16} alone /> : null}
            </Cell>
            <Cell className="waiting-what">
              <b>{thing.what}</b>
              <small>{thing.detail}</small>
            </Cell>
            <Cell className="waiting-due">{thing.due}</Cell>
            <Cell className="waiting-step">
              <ButtonLink look={thing.isFirst ? "primary" : "plain"} href={thing.step.href}>
                {thing.step.label}
                <span className="sr-only">: {thing.what}</span>
              </ButtonLink>
            </Cell>
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
