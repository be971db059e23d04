import { MonthScale, type ScaleMonth } from "@/app/_components/ui/month-scale";
import type { ReactNode } from "react";

export interface EmptyStateProps {
  /** What there is: "Three months so far." */
  title: ReactNode;
  /** What is needed next. */
  children?: ReactNode;
  /** Months that there are; shown as the month scale. */
  months?: ScaleMonth[];
}

export function EmptyState({ title, children, months }: EmptyStateProps) {
  return (
    <div className="empty-state">
      {months ? <MonthScale months={months} segment={26} /> : null}
      <p>
        <b>{title}</b> {children}
      </p>
    </div>
  );
}
