import { Link } from "@/app/_components/ui/link";
import { classNames } from "@/app/_components/ui/class-names";
import type { ReactNode } from "react";

export interface LinkItem {
  href: string;
  label: ReactNode;
  /** After the label. */
  count?: number;
  current?: boolean;
}

export interface LinkListProps {
  label: string;
  items: LinkItem[];
  className?: string;
}

/** Tabs that are links: each has its own address. */
export function Tabs(props: LinkListProps) {
  return <LinkList look="tabs" {...props} />;
}

/** A joined row of links for one choice among few, such as how limits are drawn. */
export function Segmented(props: LinkListProps) {
  return <LinkList look="segmented" {...props} />;
}

/** Pages of one area, down the left. */
export function SideNav(props: LinkListProps) {
  return <LinkList look="side-nav" {...props} />;
}

function LinkList({ label, items, look, className }: LinkListProps & { look: string }) {
  return (
    <nav className={classNames(look, className)} aria-label={label}>
      <ul>
        {items.map((item) => (
          <li key={item.href}>
            <Link href={item.href} aria-current={item.current ? "page" : undefined}>
              <span>{item.label}</span>
              {item.count === undefined ? null : <b> {item.count}</b>}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
