// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { ControlChart } from "@/app/_components/chart";
import { readmissions } from "@/tests/unit/scene/sample-chart";

const data = readmissions();
const links = data.points.map((point) => (point.state === "missing" ? null : `/months/${point.month}`));

afterEach(cleanup);

function show(withLinks = true) {
  const view = render(<ControlChart data={data} id="chart" monthLinks={withLinks ? links : undefined} />);
  const strip = view.container.querySelector("dl");
  if (!strip) throw new Error("no reading strip");
  return { ...view, strip, frame: screen.getByRole("group") };
}

function press(frame: HTMLElement, ...keys: string[]): void {
  for (const key of keys) fireEvent.keyDown(frame, { key });
}

function markedMonth(container: HTMLElement): string | null {
  return container.querySelector(".chart-pointer path")?.getAttribute("d") ?? null;
}

describe("the reading strip", () => {
  it("shows the latest counted month before anything is pointed at, and is read out politely", () => {
    const { strip, container } = show();
    expect(strip.getAttribute("aria-live")).toBe("polite");
    expect(strip.textContent).toContain("October 2026");
    expect(strip.textContent).toContain("Action limits2.2 to 16.8");
    expect(strip.textContent).toContain("Past the warning limit");
    expect(markedMonth(container)).toBeNull();
  });

  it("left and right move a month", () => {
    const { strip, frame } = show();
    press(frame, "ArrowLeft");
    expect(strip.textContent).toContain("September 2026");
    press(frame, "ArrowRight", "ArrowRight");
    expect(strip.textContent).toContain("November 2026");
    expect(strip.textContent).toContain("6 so far");
  });

  it("stops at both ends", () => {
    const { strip, frame } = show();
    press(frame, "End", "ArrowRight");
    expect(strip.textContent).toContain("November 2026");
    press(frame, "Home", "ArrowLeft");
    expect(strip.textContent).toContain("December 2023");
  });

  it("Home and End jump to the first and last month", () => {
    const { strip, frame } = show();
    press(frame, "Home");
    expect(strip.textContent).toContain("December 2023");
    press(frame, "End");
    expect(strip.textContent).toContain("November 2026");
  });

  it("keeps the page from scrolling on its own keys and leaves others alone", () => {
    const { frame } = show();
    expect(fireEvent.keyDown(frame, { key: "ArrowLeft" })).toBe(false);
    expect(fireEvent.keyDown(frame, { key: "Tab" })).toBe(true);
    expect(fireEvent.keyDown(frame, { key: "ArrowLeft", altKey: true })).toBe(true);
  });

  it("a dotted line marks the month", () => {
    const { frame, container } = show();
    press(frame, "Home");
    const first = markedMonth(container);
    press(frame, "ArrowRight");
    expect(first).not.toBeNull();
    expect(markedMonth(container)).not.toBe(first);
  });

  it("Escape leaves the chart and goes back to the latest month", () => {
    const { frame, strip, container } = show();
    frame.focus();
    press(frame, "Home", "Escape");
    expect(document.activeElement).not.toBe(frame);
    expect(strip.textContent).toContain("October 2026");
    expect(markedMonth(container)).toBeNull();
  });

  it("Enter opens the month, where it has a page", () => {
    const { frame, strip } = show();
    const opened = vi.fn((event: Event) => event.preventDefault());
    strip.addEventListener("click", opened);
    press(frame, "Home", "Enter");
    expect(opened).toHaveBeenCalledTimes(1);
    expect(within(strip).getByRole("link").getAttribute("href")).toBe("/months/2023-12");
    press(frame, ...Array.from({ length: 26 }, () => "ArrowRight"));
    expect(strip.textContent).toContain("No return sent");
    press(frame, "Enter");
    expect(opened).toHaveBeenCalledTimes(1);
  });

  it("is one tab stop", () => {
    const { container } = show();
    const stops = container.querySelectorAll('[tabindex="0"], a:not([tabindex="-1"]), button, input');
    expect([...stops]).toEqual([screen.getByRole("group")]);
  });

  it("pointing at a month fills it", () => {
    const { strip, container, frame } = show();
    const canvas = container.querySelector(".chart-canvas");
    const svg = container.querySelector("svg.chart-svg");
    const width = Number(svg?.getAttribute("width"));
    vi.spyOn(canvas as Element, "getBoundingClientRect").mockReturnValue(new DOMRect(100, 0, width, 400));
    // The first slot begins at 62 in the picture, which lies 100 to the right in the window.
    fireEvent.pointerMove(frame, { clientX: 100 + 62 + 5 });
    expect(strip.textContent).toContain("December 2023");
    fireEvent.pointerMove(frame, { clientX: 100 + 20 });
    expect(strip.textContent).toContain("December 2023");
  });
});

describe("the picture", () => {
  it("has a name that points to the table", () => {
    show();
    const picture = screen.getByRole("img", { name: /^Control chart of unplanned readmissions/ });
    expect(picture.getAttribute("aria-labelledby")).toBe("chart-name");
  });

  it("names its keys for those who can't see them, with Enter only where months open", () => {
    const { frame } = show();
    expect(frame.getAttribute("aria-label")).toContain("Enter opens it");
    cleanup();
    expect(show(false).frame.getAttribute("aria-label")).not.toContain("Enter");
  });
});
