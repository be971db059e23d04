import type { Config } from "tailwindcss";

/** Utilities speak the design's own words: its eleven colours, its spaces and its type scale, and no others. */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}"],
  theme: {
    colors: {
      transparent: "transparent",
      current: "currentColor",
      paper: "var(--paper)",
      sheet: "var(--sheet)",
      buff: "var(--buff)",
      hair: "var(--hair)",
      rule: "var(--rule)",
      ink: "var(--ink)",
      ink2: "var(--ink2)",
      channel: "var(--channel)",
      edge: "var(--edge)",
      over: "var(--over)",
      overtint: "var(--overtint)",
    },
    fontFamily: { text: "var(--font-text)", title: "var(--font-title)" },
    fontSize: {
      xs: "var(--size-0)",
      sm: "var(--size-1)",
      md: "var(--size-2)",
      base: "var(--size-3)",
      lg: "var(--size-4)",
      xl: "var(--size-5)",
      title: "var(--size-6)",
    },
    borderRadius: { none: "0", control: "var(--radius)" },
    screens: { tablet: "601px", desktop: "1101px" },
    extend: {
      spacing: {
        1: "var(--space-1)",
        2: "var(--space-2)",
        3: "var(--space-3)",
        4: "var(--space-4)",
        6: "var(--space-5)",
        8: "var(--space-6)",
      },
      transitionDuration: { quick: "var(--quick)", slow: "var(--slow)" },
      transitionTimingFunction: { plain: "var(--ease)" },
    },
  },
};

export default config;
