import { z } from "zod";
import { routeModules } from "@/app/api/_routes";
import { openApiDocument } from "@/app/api/openapi.json/document";
import { route, type RouteHandler } from "@/lib/http";

export const GET: RouteHandler = route({
  summary: "This description of the API",
  response: z.record(z.string(), z.unknown()),
  run: () => Promise.resolve(openApiDocument({ ...routeModules, "/api/openapi.json": { GET } })),
});
