import { Mark } from "@/app/_components/ui/mark";
import { primitiveWords } from "@/lib/strings/frame";
import type { ReactNode, Ref } from "react";

export interface ErrorSummaryProps {
  /** One entry a control, in the page's order; `fieldId` is the control's id. */
  errors: { fieldId: string; words: ReactNode }[];
  title?: ReactNode;
  /** To move the focus here after a try to send. */
  ref?: Ref<HTMLDivElement>;
}

/** What needs fixing before the form can be sent, each with a link to its control. */
export function ErrorSummary({ errors, title, ref }: ErrorSummaryProps) {
  if (errors.length === 0) return null;
  return (
    <div className="notice notice-fix mark-line mb-3" role="alert" tabIndex={-1} ref={ref}>
      <Mark mark="fix" size={15} />
      <div>
        <b>{title ?? primitiveWords.needsFixing(errors.length)}</b>
        <ul>
          {errors.map((error) => (
            <li key={error.fieldId}>
              <a href={`#${error.fieldId}`}>{error.words}</a>
            </li>
          ))}
        </ul>
      </div>
    </div>
  );
}
