import { classNames } from "@/app/_components/ui/class-names";
import type { ComponentProps, ReactNode } from "react";

export interface DataTableProps extends ComponentProps<"table"> {
  /** Every table has one; `hideCaption` keeps it for those who listen. */
  caption: ReactNode;
  captionNote?: ReactNode;
  hideCaption?: boolean;
  look?: "tight" | "plain" | "roomy";
}

/** A real table: thead and tbody are its children. */
export function DataTable({
  caption,
  captionNote,
  hideCaption,
  look = "plain",
  className,
  children,
  ...rest
}: DataTableProps) {
  const lookClass = look === "plain" ? null : look === "tight" ? "data-table-tight" : "data-table-roomy";
  return (
    <table {...rest} className={classNames("data-table", lookClass, className)}>
      <caption className={hideCaption ? "sr-only" : undefined}>
        {caption}
        {captionNote ? <small>{captionNote}</small> : null}
      </caption>
      {children}
    </table>
  );
}

export type RowTone = "signal" | "selected" | "quiet" | "divider";

export function DataRow({ tone, className, ...rest }: ComponentProps<"tr"> & { tone?: RowTone }) {
  return (
    <tr
      {...rest}
      aria-current={tone === "selected" ? true : undefined}
      className={classNames(tone && `row-${tone}`, className) || undefined}
    />
  );
}

export function HeadCell({ numeric, className, ...rest }: ComponentProps<"th"> & { numeric?: boolean }) {
  return <th scope="col" {...rest} className={classNames(numeric && "numeric", className) || undefined} />;
}

export function RowHead({ numeric, className, ...rest }: ComponentProps<"th"> & { numeric?: boolean }) {
  return <th scope="row" {...rest} className={classNames(numeric && "numeric", className) || undefined} />;
}

export interface CellProps extends ComponentProps<"td"> {
  numeric?: boolean;
  /** Italic: Ebbline worked it out, nobody typed it. */
  workedOut?: boolean;
  needsFixing?: boolean;
}

export function Cell({ numeric, workedOut, needsFixing, className, ...rest }: CellProps) {
  const names = classNames(
    numeric && "numeric",
    workedOut && "worked-out",
    needsFixing && "cell-fix",
    className,
  );
  return <td {...rest} className={names || undefined} />;
}
