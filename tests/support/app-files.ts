import { readdirSync } from "node:fs";
import path from "node:path";
import type { RouteHandler } from "@/lib/http";

const root = path.resolve(import.meta.dirname, "../..");

export const routeMethods = ["GET", "POST", "PUT", "PATCH", "DELETE"] as const;
export type RouteMethod = (typeof routeMethods)[number];

/** One method of one route file. */
export interface FoundRoute {
  /** As in the API's description: `/api/wards/{code}`. */
  path: string;
  method: RouteMethod;
  handler: RouteHandler;
}

/** Next-auth makes its own handler, which says nothing about itself. */
export const LIBRARY_ROUTE = "/api/auth/{...nextauth}";
/** Answers for every address that no other file answers. */
export const UNKNOWN_ROUTE = "/api/{...path}";

function filesNamed(folder: string, name: string): string[] {
  return readdirSync(path.join(root, folder), { recursive: true, encoding: "utf8" })
    .filter((file) => path.basename(file) === name)
    .sort();
}

/** Every method that a route file exports, read from the files themselves, so that a new one is found unasked. */
export async function findRoutes(): Promise<FoundRoute[]> {
  const found: FoundRoute[] = [];
  for (const file of filesNamed("app/api", "route.ts")) {
    const address = `/api/${path.dirname(file)}`.replaceAll("[", "{").replaceAll("]", "}");
    if (address === LIBRARY_ROUTE) continue;
    const exported = (await import(path.join(root, "app/api", file))) as Partial<
      Record<RouteMethod, RouteHandler>
    >;
    for (const method of routeMethods) {
      const handler = exported[method];
      if (handler) found.push({ path: address, method, handler });
    }
  }
  return found;
}

/** Addresses of the pages of a group of folders, parameters as Next writes them: `/returns/[ward]/[month]`. */
export function findPages(group: "(signed-in)" | "(public)"): string[] {
  return filesNamed(`app/${group}`, "page.tsx").map((file) => {
    const folder = path.dirname(file);
    return folder === "." ? "/" : `/${folder}`;
  });
}
