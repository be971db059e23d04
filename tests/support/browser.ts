import { existsSync } from "node:fs";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { chromium, type BrowserContext } from "playwright-core";
import { DEMO_PASSWORD, demoAccounts, type DemoAccount } from "./http-client";

const CHROMIUM = ["/usr/bin/chromium", "/usr/bin/chromium-browser"].find((each) => existsSync(each));

/** Quiet, and asks nobody anything on its own. */
const SWITCHES = [
  "--no-sandbox",
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

export interface Window {
  context: BrowserContext;
  close: () => Promise<void>;
}

export interface WindowOptions {
  width?: number;
  height?: number;
  theme?: "light" | "dark";
  javaScript?: boolean;
}

/** Debian's Chromium with an empty profile of its own. */
export async function openWindow(options: WindowOptions = {}): Promise<Window> {
  if (!CHROMIUM) throw new Error("Install chromium first: apt-get install chromium");
  const profile = await mkdtemp(path.join(tmpdir(), "ebbline-browser-"));
  const context = await chromium.launchPersistentContext(profile, {
    executablePath: CHROMIUM,
    headless: true,
    args: SWITCHES,
    viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
    colorScheme: options.theme ?? "light",
    javaScriptEnabled: options.javaScript ?? true,
    reducedMotion: "reduce",
  });
  return {
    context,
    close: async () => {
      await context.close();
      await rm(profile, { recursive: true, force: true });
    },
  };
}

/** Signs in through the page, as a person would. */
export async function signInOnPage(
  context: BrowserContext,
  url: string,
  account: DemoAccount,
): Promise<void> {
  const page = context.pages()[0] ?? (await context.newPage());
  await page.goto(`${url}/sign-in`);
  await page.getByLabel("Hospital email").fill(demoAccounts[account]);
  await page.getByLabel("Password").fill(DEMO_PASSWORD);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((address) => !address.pathname.startsWith("/sign-in"));
}
