import { Link } from "@/app/_components/ui/link";
import { MastheadMenu } from "@/app/_components/frame/masthead-menu";
import { Wordmark } from "@/app/_components/frame/wordmark";
import { YearScale } from "@/app/_components/frame/year-scale";
import { frameWords } from "@/lib/strings/frame";
import type { ReactNode } from "react";

export interface MastheadLink {
  href: string;
  label: string;
  current?: boolean;
  /** How many wait there. */
  count?: number;
}

export interface MastheadProps {
  hospitalName: string;
  personName: string;
  roleName: string;
  links: MastheadLink[];
  /** Month of the year (1 to 12) whose return is under way; null for none. */
  returnMonth: number | null;
  /** A link or a form with one button. */
  signOut: ReactNode;
}

export function Masthead({ hospitalName, personName, roleName, links, returnMonth, signOut }: MastheadProps) {
  return (
    <header className="masthead">
      <div className="masthead-row">
        <Link className="brand" href="/" aria-label={frameWords.startPage}>
          <Wordmark />
        </Link>
        <MastheadMenu>
          <nav aria-label={frameWords.mainNavigation}>
            <ul>
              {links.map((link) => (
                <li key={link.href}>
                  <Link href={link.href} aria-current={link.current ? "page" : undefined}>
                    {link.label}
                    {link.count ? <LinkCount count={link.count} /> : null}
                  </Link>
                </li>
              ))}
            </ul>
          </nav>
          <div className="masthead-who">
            <span className="masthead-place">{hospitalName}</span>
            <span className="masthead-person">
              {personName}
              <span className="masthead-role"> {roleName}</span>
            </span>
            {signOut}
          </div>
        </MastheadMenu>
      </div>
      <YearScale returnMonth={returnMonth} />
    </header>
  );
}

function LinkCount({ count }: { count: number }) {
  return (
    <>
      {" "}
      <span className="count-tag">
        {count}
        <span className="sr-only"> {frameWords.open}</span>
      </span>
    </>
  );
}
