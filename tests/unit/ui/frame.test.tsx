// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { renderToStaticMarkup } from "react-dom/server";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { ThemeScript, ThemeSwitch } from "@/app/_components/frame";
import { MastheadMenu } from "@/app/_components/frame/masthead-menu";
import { themeStorageKey } from "@/app/_components/frame/theme";

afterEach(cleanup);

describe("the menu", () => {
  it("opens and closes with its button, and says which", () => {
    render(<MastheadMenu>links</MastheadMenu>);
    const button = screen.getByRole("button", { name: "Menu" });
    const menu = document.getElementById(button.getAttribute("aria-controls") ?? "");
    expect(button.getAttribute("aria-expanded")).toBe("false");
    fireEvent.click(button);
    expect(button.getAttribute("aria-expanded")).toBe("true");
    expect(menu?.className).toContain("masthead-menu-open");
    fireEvent.click(button);
    expect(menu?.className).not.toContain("masthead-menu-open");
  });

  it("Escape closes it and goes back to the button", () => {
    render(
      <MastheadMenu>
        <a href="/signals">Signals</a>
      </MastheadMenu>,
    );
    const button = screen.getByRole("button");
    fireEvent.click(button);
    screen.getByRole("link").focus();
    fireEvent.keyDown(screen.getByRole("link"), { key: "Escape" });
    expect(button.getAttribute("aria-expanded")).toBe("false");
    expect(document.activeElement).toBe(button);
  });
});

describe("the theme", () => {
  beforeEach(() => {
    localStorage.clear();
    delete document.documentElement.dataset.theme;
  });

  it("follows the device until one is chosen, and keeps the choice", () => {
    render(<ThemeSwitch />);
    const select = screen.getByLabelText<HTMLSelectElement>("Theme");
    expect(select.value).toBe("system");
    fireEvent.change(select, { target: { value: "dark" } });
    expect(document.documentElement.dataset.theme).toBe("dark");
    expect(localStorage.getItem(themeStorageKey)).toBe("dark");
    expect(select.value).toBe("dark");
    fireEvent.change(select, { target: { value: "system" } });
    expect(document.documentElement.dataset.theme).toBeUndefined();
    expect(localStorage.getItem(themeStorageKey)).toBeNull();
  });

  it.each([
    ["dark", "dark"],
    ["light", "light"],
    ["sepia", undefined],
    [null, undefined],
  ])("a page with %s kept starts as %s", (kept, expected) => {
    if (kept !== null) localStorage.setItem(themeStorageKey, kept);
    const markup = renderToStaticMarkup(<ThemeScript nonce="n" />);
    const script = document.createElement("script");
    script.textContent = /<script[^>]*>(.*)<\/script>/.exec(markup)?.[1] ?? "";
    document.head.append(script);
    expect(document.documentElement.dataset.theme).toBe(expected);
    script.remove();
  });
});
