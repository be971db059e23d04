export type SearchParams = Record<string, string | string[] | undefined>;

/** One value of the address; blank ones, as a form sends them, and repeated ones count as absent. */
export function oneOf(value: string | string[] | undefined): string | undefined {
  return typeof value === "string" && value !== "" ? value : undefined;
}

/** The filled-in single values of an address. */
export function filled(search: SearchParams): Record<string, string> {
  return Object.fromEntries(
    Object.entries(search).flatMap(([name, value]) => {
      const one = oneOf(value);
      return one === undefined ? [] : [[name, one] as const];
    }),
  );
}

/** An address with some values changed; undefined takes one away. */
export function addressOf(
  path: string,
  search: Record<string, string | undefined>,
  change: Record<string, string | undefined> = {},
): string {
  const params = new URLSearchParams();
  for (const [name, value] of Object.entries({ ...search, ...change })) {
    if (value !== undefined && value !== "") params.set(name, value);
  }
  const text = params.toString();
  return text === "" ? path : `${path}?${text}`;
}
