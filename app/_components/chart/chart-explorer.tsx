"use client";

import { Link } from "@/app/_components/ui/link";
import { useRef, useState, type KeyboardEvent, type PointerEvent, type ReactNode } from "react";
import { ReadingStrip } from "@/app/_components/chart/reading-strip";
import { readingStripWords } from "@/lib/strings/chart";
import type { MonthReading } from "@/lib/scene/reading";
import type { Scene } from "@/lib/scene/scene";

export interface ChartExplorerProps {
  title: string;
  numeratorLabel: string;
  denominatorLabel: string;
  readings: MonthReading[];
  /** Month shown before anything is pointed at. */
  start: number;
  geometry: Pick<Scene, "width" | "height" | "plot" | "slots">;
  /** Address of each month's own page; null where it has none. */
  links?: (string | null)[];
  /** The drawn chart. */
  children: ReactNode;
}

/** Pointing at or arrowing to a month fills the reading strip; the chart is one tab stop. */
export function ChartExplorer(props: ChartExplorerProps) {
  const { readings, start, geometry, links } = props;
  const [chosen, setChosen] = useState<number | null>(null);
  const frame = useRef<HTMLDivElement>(null);
  const canvas = useRef<HTMLDivElement>(null);
  const link = useRef<HTMLAnchorElement>(null);
  const shown = chosen ?? start;
  const reading = readings[shown];
  const href = links?.[shown] ?? null;

  function choose(index: number) {
    const next = Math.min(Math.max(index, 0), readings.length - 1);
    setChosen(next);
    bringIntoView(frame.current, canvas.current, geometry.slots[next]);
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const target = targetOf(event.key, shown, readings.length);
    if (target !== null) choose(target);
    else if (event.key === "Enter") link.current?.click();
    else if (event.key === "Escape") {
      setChosen(null);
      frame.current?.blur();
    } else return;
    event.preventDefault();
  }

  function onPointer(event: PointerEvent) {
    const box = canvas.current?.getBoundingClientRect();
    if (!box) return;
    const x = ((event.clientX - box.left) / (box.width || geometry.width)) * geometry.width;
    const index = geometry.slots.findIndex((slot) => x >= slot.from && x < slot.to);
    if (index >= 0) setChosen(index);
  }

  if (reading === undefined) return <div className="chart-frame">{props.children}</div>;
  const frameName = links ? readingStripWords.frameWithLinks : readingStripWords.frame;
  return (
    <div className="chart-frame">
      <ReadingStrip
        reading={reading}
        numeratorLabel={props.numeratorLabel}
        denominatorLabel={props.denominatorLabel}
        monthLink={
          href === null ? null : (
            <Link href={href} ref={link} tabIndex={-1} prefetch={false}>
              {reading.month}
            </Link>
          )
        }
      />
      <div
        className="chart-scroll"
        ref={frame}
        tabIndex={0}
        role="group"
        aria-label={frameName(props.title)}
        onFocus={() => setChosen(shown)}
        onKeyDown={onKeyDown}
        onPointerMove={onPointer}
        onPointerDown={onPointer}
      >
        <div className="chart-canvas" ref={canvas}>
          {props.children}
          {chosen === null ? null : <ChosenMonth geometry={geometry} index={chosen} />}
        </div>
      </div>
    </div>
  );
}

function targetOf(key: string, shown: number, count: number): number | null {
  if (key === "ArrowLeft") return shown - 1;
  if (key === "ArrowRight") return shown + 1;
  if (key === "Home") return 0;
  return key === "End" ? count - 1 : null;
}

/** A dotted line marks the month. It lies over the chart, which stays as the server drew it. */
function ChosenMonth({ geometry, index }: { geometry: ChartExplorerProps["geometry"]; index: number }) {
  const slot = geometry.slots[index];
  if (slot === undefined) return null;
  return (
    <svg
      className="chart-pointer"
      viewBox={`0 0 ${geometry.width} ${geometry.height}`}
      width={geometry.width}
      height={geometry.height}
      aria-hidden="true"
    >
      <path
        className="stroke-ink"
        d={`M${slot.centre} ${geometry.plot.top}V${geometry.plot.floor}`}
        strokeWidth={1}
        strokeDasharray="1 2"
      />
    </svg>
  );
}

/** Scrolls the frame just far enough for the month and a neighbour to be seen. */
function bringIntoView(
  frame: HTMLElement | null,
  canvas: HTMLElement | null,
  slot: Scene["slots"][number] | undefined,
): void {
  if (!frame || !canvas || !slot) return;
  const seen = frame.getBoundingClientRect();
  const origin = canvas.getBoundingClientRect().left;
  const spare = slot.to - slot.from;
  const beforeLeft = seen.left - (origin + slot.from - spare);
  const beyondRight = origin + slot.to + spare - seen.right;
  if (beforeLeft > 0) frame.scrollLeft -= beforeLeft;
  else if (beyondRight > 0) frame.scrollLeft += beyondRight;
}
