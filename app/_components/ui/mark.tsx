import { markNames, type MarkId } from "@/lib/strings/frame";
import { classNames } from "@/app/_components/ui/class-names";

const inOver = new Set<MarkId>(["above", "below", "warn", "pair", "run", "fix", "conflict"]);

export interface MarkProps {
  mark: MarkId;
  size?: number;
  /** True where no name stands beside the mark: it then carries its own. */
  alone?: boolean;
}

/** One mark of the sprite. The shape carries the meaning; the colour only repeats it. */
export function Mark({ mark, size = 14, alone = false }: MarkProps) {
  const naming = alone ? { role: "img", "aria-label": markNames[mark] } : { "aria-hidden": true };
  return (
    <svg
      className={classNames("mark", inOver.has(mark) && "mark-over")}
      viewBox="0 0 16 16"
      width={size}
      height={size}
      focusable="false"
      {...naming}
    >
      <use href={markHref(mark)} />
    </svg>
  );
}

/** A mark before its name, or before other words that say the same. */
export function NamedMark({ mark, size, name }: Omit<MarkProps, "alone"> & { name?: string }) {
  return (
    <span>
      <Mark mark={mark} size={size} /> {name ?? markNames[mark]}
    </span>
  );
}

export function markHref(mark: MarkId): string {
  return `/glyphs.svg#eb-${mark}`;
}

export function isOverprint(mark: MarkId): boolean {
  return inOver.has(mark);
}
