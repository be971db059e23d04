import { isOverprint, markHref } from "@/app/_components/ui/mark";
import type { MarkId } from "@/lib/strings/frame";

/** `done` alternates filled and empty; `now` is in the accent; `gap` has a broken outline; `later` is empty. */
export interface ScaleMonth {
  state: "done" | "now" | "gap" | "later";
  mark?: MarkId;
}

export interface MonthScaleProps {
  months: ScaleMonth[];
  /** What the bar shows, in words; without it the bar is decoration beside the same words. */
  label?: string;
  segment?: number;
}

/** A bar of alternating filled and empty segments, one a month, with marks beneath. */
export function MonthScale({ months, label, segment = 21 }: MonthScaleProps) {
  const marked = months.some((month) => month.mark);
  const width = months.length * segment + 1;
  const height = marked ? 30 : 8;
  const naming = label ? { role: "img", "aria-label": label } : { "aria-hidden": true };
  return (
    <svg className="month-scale" viewBox={`0 0 ${width} ${height}`} width={width} height={height} {...naming}>
      {months.map((month, index) => (
        <ScaleSegment key={index} month={month} index={index} segment={segment} />
      ))}
    </svg>
  );
}

function ScaleSegment({ month, index, segment }: { month: ScaleMonth; index: number; segment: number }) {
  const x = index * segment + 0.5;
  return (
    <>
      <rect
        className={`${fillOf(month.state, index)} stroke-ink`}
        x={x}
        y={1}
        width={segment}
        height={6}
        strokeWidth={1}
        strokeDasharray={month.state === "gap" ? "2 2" : undefined}
      />
      {month.mark ? (
        <use
          className={isOverprint(month.mark) ? "text-over" : "text-ink"}
          href={markHref(month.mark)}
          x={x + segment / 2 - 6.5}
          y={13.5}
          width={13}
          height={13}
        />
      ) : null}
    </>
  );
}

function fillOf(state: ScaleMonth["state"], index: number): string {
  if (state === "now") return "fill-over";
  if (state === "gap" || state === "later") return "fill-none";
  return index % 2 === 0 ? "fill-ink" : "fill-sheet";
}
