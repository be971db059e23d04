/** Pages of set-up in the order of the menu. Baselines are set on the charts themselves. */
export const setUpPages = [
  { name: "hospital", href: "/set-up/hospital" },
  { name: "wards", href: "/set-up/wards" },
  { name: "indicators", href: "/set-up/indicators" },
  { name: "assignments", href: "/set-up/assignments" },
  { name: "people", href: "/people" },
  { name: "baselines", href: "/charts" },
  { name: "record", href: "/set-up/record" },
] as const;

export type SetUpPage = (typeof setUpPages)[number]["name"];
