// Takes every page as each role on the demo hospital, at three widths, light, dark and printed, for people to look at.
import { mkdir } from "node:fs/promises";
import path from "node:path";
import { openWindow, signInOnPage } from "@/tests/support/browser";
import type { DemoAccount } from "@/tests/support/http-client";
import { pagesFor } from "@/tests/support/pages";
import { startServer } from "@/tests/support/server";

const folder = path.resolve(import.meta.dirname, "../../.shots");
const widths = [1440, 768, 390] as const;
const themes = ["light", "dark"] as const;
const wanted = process.argv[2];

async function shoot(
  url: string,
  account: DemoAccount | null,
  width: number,
  theme: "light" | "dark",
): Promise<void> {
  const window = await openWindow({ width, theme, height: width === 390 ? 844 : 900 });
  if (account) await signInOnPage(window.context, url, account);
  const page = window.context.pages()[0] ?? (await window.context.newPage());
  for (const [name, address] of pagesFor(account)) {
    if (wanted && !name.includes(wanted)) continue;
    await page.goto(url + address, { waitUntil: "load" });
    const file = path.join(folder, `${account ?? "anyone"}-${name}-${width}-${theme}`);
    await page.screenshot({ path: `${file}.png`, fullPage: true });
    if (width === 1440 && theme === "light") await page.pdf({ path: `${file}-print.pdf`, format: "A4" });
  }
  await window.close();
}

await mkdir(folder, { recursive: true });
const server = await startServer();
try {
  for (const account of [null, "nurse", "infection", "lead", "board"] as const) {
    for (const width of widths) for (const theme of themes) await shoot(server.url, account, width, theme);
  }
  console.log(`Pictures are in ${folder}`);
} finally {
  await server.stop();
}
