import type { Locator, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { openWindow, signInOnPage, type Window } from "@/tests/support/browser";
import type { DemoAccount } from "@/tests/support/http-client";
import { startServer, type TestServer } from "@/tests/support/server";

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

/** Does a job as an account at a width, on a page of its own. */
async function as(account: DemoAccount, width: number, job: (page: Page) => Promise<void>): Promise<void> {
  const window: Window = await openWindow({ width, height: width === 390 ? 844 : 900 });
  try {
    await signInOnPage(window.context, server.url, account);
    await job(window.context.pages()[0] ?? (await window.context.newPage()));
  } finally {
    await window.close();
  }
}

/** What the demo's lines are counted out of: larger numbers go there, so that every pair can be. */
const OUT_OF =
  /bed days|catheter days|discharges|doses due|sets due|moments seen|admissions checked|patients asked/i;

/** The name by which a box is read out. */
function nameOf(box: Locator): Promise<string> {
  return box.evaluate((element: HTMLInputElement) => {
    const ids = element.getAttribute("aria-labelledby")?.split(" ") ?? [];
    const labelled = ids.map((id) => document.getElementById(id)?.textContent ?? "").join(" ");
    return element.ariaLabel ?? (labelled || (element.labels?.[0]?.textContent ?? ""));
  });
}

/** Fills every blank box of an open return, one after the other, by keyboard. */
async function fillBlankBoxes(page: Page): Promise<void> {
  const boxes = page.locator("main table input:not([type=hidden]):visible, main [role=table] input:visible");
  for (let index = 0; index < (await boxes.count()); index += 1) {
    const box = boxes.nth(index);
    if ((await box.inputValue()) !== "") continue;
    await box.focus();
    await page.keyboard.type(OUT_OF.test(await nameOf(box)) ? "140" : "7");
    await page.keyboard.press("Tab");
  }
}

describe("a nurse's month", () => {
  it("is filled in, sent and explained on a phone", async () => {
    await as("nurse2", 390, async (page) => {
      await page.goto(server.url);
      await page
        .getByRole("link", { name: /carry on|begin|fill/i })
        .first()
        .click();
      await page.waitForURL(/\/returns\/CURLEW\/2026-11/);
      await fillBlankBoxes(page);
      const send = page.getByRole("button", { name: "Send return" });
      await send.click();
      await page.getByRole("heading", { name: /return is sent/i }).waitFor();
      expect(await page.getByText("Take it back to change it").isVisible()).toBe(true);
    });
  });

  it("shows which lines are still to enter, and what can't be", async () => {
    await as("nurse", 1440, async (page) => {
      await page.goto(`${server.url}/returns/OSIER/2026-11`);
      const missed = page.getByLabel(/Moments missed/i).first();
      const seen = page.getByLabel(/Moments seen/i).first();
      await seen.fill("19");
      await seen.press("Tab");
      await missed.fill("118");
      await missed.press("Tab");
      await page
        .getByText(/118.*19|more than/i)
        .first()
        .waitFor();
      expect(await page.getByText(/still to enter/i).count()).toBeGreaterThan(0);
    });
  });
});

describe("infection control", () => {
  it("reads a chart by keyboard, month by month", async () => {
    await as("infection", 1440, async (page) => {
      await page.goto(`${server.url}/charts/ALDER/GUT-INF`);
      const figure = page
        .getByRole("group", { name: /chart|month/i })
        .or(page.locator("[data-chart-frame]"))
        .first();
      await figure.focus();
      await page.keyboard.press("End");
      await page.keyboard.press("ArrowLeft");
      expect(await page.locator("[aria-live=polite]").first().innerText()).toMatch(/2026/);
    });
  });

  it("is refused the pages of the lead", async () => {
    await as("infection", 1440, async (page) => {
      expect((await page.goto(`${server.url}/set-up/wards`))?.status()).toBe(403);
      expect((await page.goto(`${server.url}/people`))?.status()).toBe(403);
    });
  });
});

describe("a quality lead", () => {
  it("adds a ward and accepts a return", async () => {
    await as("lead", 1440, async (page) => {
      await page.goto(`${server.url}/set-up/wards/new`);
      await page.getByLabel("Code").fill("REED");
      await page.getByLabel("Name").fill("Reed ward");
      await page.getByLabel("Division").fill("Surgery");
      await page.getByLabel("Open from").fill("2026-01");
      await page.getByRole("button", { name: "Add a ward" }).click();
      await page.getByRole("cell", { name: "REED" }).or(page.getByText("Reed ward")).first().waitFor();

      await page.goto(`${server.url}/returns/DUNLIN/2026-11`);
      await page.getByRole("button", { name: "Accept" }).first().click();
      await page.getByRole("heading", { name: /return is accepted/i }).waitFor();
    });
  });
});

describe("a board member", () => {
  it("meets published packs and nothing else", async () => {
    await as("board", 1440, async (page) => {
      await page.goto(server.url);
      await page.waitForURL(/\/packs/);
      expect(await page.getByText(/no pack has been published/i).isVisible()).toBe(true);
      expect((await page.goto(`${server.url}/charts/OSIER/FALLS`))?.status()).toBe(403);
      expect((await page.goto(`${server.url}/returns`))?.status()).toBe(403);
    });
  });
});
