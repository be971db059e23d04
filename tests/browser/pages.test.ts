import AxeBuilder from "@axe-core/playwright";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { openWindow, signInOnPage } from "@/tests/support/browser";
import type { DemoAccount } from "@/tests/support/http-client";
import { pagesFor } from "@/tests/support/pages";
import { startServer, type TestServer } from "@/tests/support/server";

const AXE_RULES = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.stop());

/** Everything that a page must not do, collected while it is used. */
function watch(page: Page, url: string): string[] {
  const faults: string[] = [];
  page.on("request", (request) => {
    const isOwn = request.url().startsWith(url) || request.url().startsWith("data:");
    if (!isOwn) faults.push(`asked another host: ${request.url()}`);
  });
  page.on("console", (message) => {
    // A page that says 404 or 403 on purpose is reported by the browser as a failed resource.
    const isRefusal = /status of 40[34]/.test(message.text());
    if (message.type() === "error" && !isRefusal) faults.push(`console: ${message.text()}`);
  });
  page.on("pageerror", (error) => faults.push(`script: ${error.message}`));
  return faults;
}

/** The browser's own report of whatever the content security policy stopped. */
async function recordViolations(page: Page, faults: string[]): Promise<void> {
  await page.exposeFunction("reportViolation", (text: string) => faults.push(`policy: ${text}`));
  await page.addInitScript(() => {
    document.addEventListener("securitypolicyviolation", (event) => {
      const report = (window as unknown as { reportViolation: (text: string) => void }).reportViolation;
      report(`${event.violatedDirective} ${event.blockedURI}`);
    });
  });
}

/** The dark theme differs by its colours alone, so only they are looked at again. */
async function axeFindings(page: Page, colorScheme: "light" | "dark"): Promise<string[]> {
  const builder = new AxeBuilder({ page });
  const chosen =
    colorScheme === "light" ? builder.withTags(AXE_RULES) : builder.withRules(["color-contrast"]);
  const { violations } = await chosen.analyze();
  return violations.map(
    (each) => `${each.id}: ${each.nodes.map((node) => node.target.join(" ")).join("; ")}`,
  );
}

/** A page that is wider than the window is cut off on a phone. */
function overflow(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
}

const accounts: (DemoAccount | null)[] = [null, "nurse", "infection", "lead", "board"];

describe.each(accounts)("as %s", (account) => {
  it("every page is accessible in both themes, keeps to itself and fits a phone", async () => {
    const window = await openWindow();
    try {
      if (account) await signInOnPage(window.context, server.url, account);
      const page = await window.context.newPage();
      const faults = watch(page, server.url);
      await recordViolations(page, faults);
      for (const [name, path] of pagesFor(account)) {
        const note = (finding: string) => faults.push(`${name}: ${finding}`);
        await page.setViewportSize({ width: 1440, height: 900 });
        await page.goto(server.url + path, { waitUntil: "load" });
        await page.evaluate(() => document.fonts.ready.then(() => undefined));
        for (const colorScheme of ["light", "dark"] as const) {
          await page.emulateMedia({ colorScheme });
          for (const finding of await axeFindings(page, colorScheme)) note(`${colorScheme}: ${finding}`);
        }
        for (const width of [768, 390]) {
          await page.setViewportSize({ width, height: 844 });
          if ((await overflow(page)) > 0) note(`wider than ${width} px`);
        }
      }
      expect(faults).toEqual([]);
    } finally {
      await window.close();
    }
  }, 300_000);
});

describe("print and no script", () => {
  it("prints a chart with its table and without buttons", async () => {
    const window = await openWindow();
    try {
      await signInOnPage(window.context, server.url, "nurse");
      const page = window.context.pages()[0] ?? (await window.context.newPage());
      await page.goto(`${server.url}/charts/OSIER/READMIT`);
      await page.emulateMedia({ media: "print" });
      expect(await page.getByRole("navigation").first().isVisible()).toBe(false);
      expect(await page.getByRole("table").first().isVisible()).toBe(true);
      expect(await page.getByRole("img").first().isVisible()).toBe(true);
    } finally {
      await window.close();
    }
  });

  it("shows chart, words and figures where JavaScript is off", async () => {
    const withScript = await openWindow();
    await signInOnPage(withScript.context, server.url, "nurse");
    const cookies = await withScript.context.cookies();
    await withScript.close();

    const window = await openWindow({ javaScript: false });
    try {
      await window.context.addCookies(cookies);
      const page = await window.context.newPage();
      await page.goto(`${server.url}/charts/OSIER/READMIT`);
      expect(await page.getByRole("img").first().isVisible()).toBe(true);
      expect(await page.getByRole("heading", { name: "What the chart shows" }).isVisible()).toBe(true);
      expect(await page.locator("tbody tr").count()).toBeGreaterThan(30);
    } finally {
      await window.close();
    }
  });
});
