import { Link } from "@/app/_components/ui/link";
import { Mark, SectionHead } from "@/app/_components/ui";
import type { MarkId } from "@/lib/strings/frame";
import { myPageWords as say } from "@/lib/strings/my-page";

export interface KnownThing {
  key: string;
  mark: MarkId | null;
  what: string;
  detail: string;
  link?: { label: string; href: string };
}

/** What needs nothing, but is good to know. */
export function GoodToKnow({ things }: { things: readonly KnownThing[] }) {
  if (things.length === 0) return null;
  return (
    <section className="my-section">
      <SectionHead>{say.goodToKnow}</SectionHead>
      <ul className="ruled-list">
        {things.map((thing) => (
          <li key={thing.key} className="mark-line">
            {thing.mark ? <Mark mark={thing.mark} alone /> : <span className="no-mark" />}
            <div>
              <b>{thing.what}</b>
              <br />
              {thing.detail} {thing.link ? <Link href={thing.link.href}>{thing.link.label}</Link> : null}
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
