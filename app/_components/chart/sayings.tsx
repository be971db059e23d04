import { Mark } from "@/app/_components/ui/mark";
import type { Saying } from "@/lib/scene/reading";

/** What the chart says about a month, each with its mark before it. */
export function Sayings({ says }: { says: Saying[] }) {
  return says.map((saying) => (
    <span key={saying.words}>
      {saying.mark ? <Mark mark={saying.mark} size={13} /> : null} {saying.words}
    </span>
  ));
}
