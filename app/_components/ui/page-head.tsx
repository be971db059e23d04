import { Link } from "@/app/_components/ui/link";
import type { ReactNode } from "react";

export interface Crumb {
  label: string;
  /** Absent for words that lead nowhere. */
  href?: string;
}

export interface PageHeadProps {
  crumbs?: Crumb[];
  title: ReactNode;
  subtitle?: ReactNode;
  /** Buttons and switches at the right. */
  actions?: ReactNode;
}

/** Title of a page over the double rule. */
export function PageHead({ crumbs = [], title, subtitle, actions }: PageHeadProps) {
  return (
    <div className="page-head">
      <div className="page-head-words">
        {crumbs.length > 0 ? (
          <div className="crumbs">
            <ol>
              {crumbs.map((crumb) => (
                <li key={crumb.label}>
                  {crumb.href ? <Link href={crumb.href}>{crumb.label}</Link> : crumb.label}
                </li>
              ))}
            </ol>
          </div>
        ) : null}
        <h1>{title}</h1>
        {subtitle ? <p className="page-subtitle">{subtitle}</p> : null}
      </div>
      {actions ? <div className="actions">{actions}</div> : null}
    </div>
  );
}

/** A section's heading over a single rule. */
export function SectionHead({ id, note, children }: { id?: string; note?: ReactNode; children: ReactNode }) {
  return (
    <h2 className="section-head" id={id}>
      {children}
      {note ? <small>{note}</small> : null}
    </h2>
  );
}
