import { mayAttempt, type Action, type Actor } from "@/lib/policy";
import { navigationWords } from "@/lib/strings/people";

interface Area {
  href: string;
  label: string;
  /** Who may attempt this sees the link; the page itself decides. */
  action: Action;
}

const AREAS: readonly Area[] = [
  { href: "/", label: navigationWords.myPage, action: "return.read" },
  { href: "/returns", label: navigationWords.returns, action: "return.read" },
  { href: "/charts", label: navigationWords.charts, action: "chart.read" },
  { href: "/signals", label: navigationWords.signals, action: "signal.list" },
  { href: "/imports", label: navigationWords.bringIn, action: "import.create" },
  { href: "/packs", label: navigationWords.packs, action: "pack.list" },
  { href: "/set-up", label: navigationWords.setUp, action: "settings.update" },
];

export function linksFor(actor: Actor): { href: string; label: string }[] {
  return AREAS.filter((area) => mayAttempt(actor, area.action)).map(({ href, label }) => ({ href, label }));
}
