import { readFileSync } from "node:fs";
import path from "node:path";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { ControlChart, FiguresTable, SmallChart } from "@/app/_components/chart";
import { Footer, Masthead, ThemeScript } from "@/app/_components/frame";
import { EmptyState, ErrorSummary, Loading, Mark, MonthScale, PageHead, Tabs } from "@/app/_components/ui";
import { buildControlChartScene } from "@/lib/scene/control-chart";
import { markNames } from "@/lib/strings/frame";
import { chartOf, emptyPoint, pointOf, readmissions, segmentOf } from "@/tests/unit/scene/sample-chart";

const root = path.resolve(import.meta.dirname, "../../..");
const data = readmissions();

const page = renderToStaticMarkup(
  <>
    <ThemeScript nonce="abc" />
    <Masthead
      hospitalName="Harrowmere District Hospital"
      personName="Della Quarrie"
      roleName="ward nurse"
      links={[
        { href: "/", label: "My page", current: true },
        { href: "/signals", label: "Signals", count: 3 },
      ]}
      returnMonth={11}
      signOut={<a href="/sign-out">Sign out</a>}
    />
    <PageHead crumbs={[{ label: "Osier ward", href: "/o" }]} title="Unplanned readmissions" />
    <Tabs label="Signals" items={[{ href: "/a", label: "To review", count: 10, current: true }]} />
    <ControlChart data={data} id="c" monthLinks={data.points.map(() => "/m")} />
    <FiguresTable data={data} />
    <SmallChart scene={buildControlChartScene(data, "small")} />
    <MonthScale
      months={[{ state: "done" }, { state: "gap", mark: "missing" }, { state: "now" }]}
      label="Osier"
    />
    <EmptyState title="Three months so far." months={[{ state: "done" }]} />
    <ErrorSummary errors={[{ fieldId: "reason", words: "Give a reason" }]} />
    <Loading>Fetching 36 months.</Loading>
    <Footer />
  </>,
);

describe("server markup under a strict policy", () => {
  it("has no style attribute and no inline handler", () => {
    expect(page).not.toMatch(/\sstyle=/);
    expect(page).not.toMatch(/\son[a-z]+=/);
  });

  it("has one script, with the nonce", () => {
    expect(page.match(/<script[^>]*>/g)).toEqual(['<script nonce="abc">']);
  });
});

describe("the marks", () => {
  const sprite = readFileSync(path.join(root, "public/glyphs.svg"), "utf8");

  it.each(Object.entries(markNames))("%s is in the sprite", (id) => {
    expect(sprite).toContain(`<symbol id="eb-${id}"`);
  });

  it("carry their name alone, and leave it to the words beside them", () => {
    expect(renderToStaticMarkup(<Mark mark="late" alone />)).toContain('role="img" aria-label="Late return"');
    expect(renderToStaticMarkup(<Mark mark="late" />)).toContain('aria-hidden="true"');
  });
});

describe("the masthead", () => {
  it("marks the current page and says how many wait", () => {
    expect(page).toContain('aria-current="page" href="/"');
    expect(page).toMatch(/Signals <span class="count-tag">3<span class="sr-only"> open<\/span>/);
  });

  it("shows the month being returned in the accent", () => {
    const scale = /<svg class="year-scale".*?<\/svg>/.exec(page)?.[0] ?? "";
    const fills = [...scale.matchAll(/class="(fill-[a-z]+)"/g)].map((match) => match[1]);
    expect(fills).toHaveLength(12);
    expect(fills.indexOf("fill-over")).toBe(10);
    expect(fills.filter((fill) => fill === "fill-over")).toHaveLength(1);
  });
});

describe("the figures table", () => {
  const table = renderToStaticMarkup(<FiguresTable data={data} />);

  it("has a caption, column heads, row heads and a head for the earlier baseline", () => {
    expect(table).toContain("<caption>Figures by month");
    expect(table.match(/scope="col"/g)).toHaveLength(10);
    expect(table.match(/scope="row"/g)).toHaveLength(36);
    expect(table.match(/scope="rowgroup"/g)).toHaveLength(1);
    expect(table).toContain("all rates in percent; target 7.0.");
  });

  it("sets what was worked out in italics and what was entered upright", () => {
    const october = /<tr[^>]*><th scope="row">Oct 26.*?<\/tr>/.exec(table)?.[0] ?? "";
    expect(october).toContain('<td class="numeric">21</td><td class="numeric">146</td>');
    expect(october).toContain('<td class="numeric worked-out"><b>14.4</b></td>');
    expect(october.match(/worked-out/g)).toHaveLength(6);
  });

  it("tints only rows that hold an overprint mark and its name", () => {
    const rows = [...table.matchAll(/<tr class="row-signal">.*?<\/tr>/g)].map((match) => match[0]);
    expect(rows).toHaveLength(2);
    for (const row of rows) expect(row).toMatch(/mark-over.*(limit)/);
  });

  it("drops limits and their heads together on phones", () => {
    expect(table.match(/<th[^>]*not-on-phone/g)).toHaveLength(5);
    const october = /<tr[^>]*><th scope="row">Oct 26.*?<\/tr>/.exec(table)?.[0] ?? "";
    expect(october.match(/not-on-phone/g)).toHaveLength(5);
  });

  it("says a rate's unit as such", () => {
    const rates = chartOf([pointOf("2026-01", 6, 268, null)], {
      per: 1000,
      kind: "rate",
      unitWords: "per 1000 catheter days",
      segments: [segmentOf(0, 0)],
    });
    expect(renderToStaticMarkup(<FiguresTable data={rates} />)).toContain(
      "all rates per 1000 catheter days.",
    );
  });
});

it("a chart without months still stands", () => {
  expect(renderToStaticMarkup(<ControlChart data={chartOf([])} id="e" />)).toContain("No months yet");
});

it("the small chart is hidden from assistive technology", () => {
  const scene = buildControlChartScene(chartOf([emptyPoint("2026-01")]), "small");
  expect(renderToStaticMarkup(<SmallChart scene={scene} />)).toContain('aria-hidden="true"');
});
