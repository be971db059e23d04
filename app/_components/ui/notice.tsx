import { Mark } from "@/app/_components/ui/mark";
import { classNames } from "@/app/_components/ui/class-names";
import type { MarkId } from "@/lib/strings/frame";
import type { ReactNode } from "react";

export interface NoticeProps {
  /** Before the words: "fix" for what went wrong, "saved" for what is done. */
  mark?: MarkId;
  title?: ReactNode;
  children?: ReactNode;
  /** "status" is read out when convenient, "alert" at once; neither where the page came with it. */
  live?: "status" | "alert";
  className?: string;
}

export function Notice({ mark, title, children, live, className }: NoticeProps) {
  const needsFixing = mark === "fix" || mark === "conflict";
  return (
    <div className={classNames("notice mark-line", needsFixing && "notice-fix", className)} role={live}>
      {mark ? <Mark mark={mark} size={15} /> : null}
      <div>
        {title ? <b>{title} </b> : null}
        {children}
      </div>
    </div>
  );
}
