import { zodResolver } from "@hookform/resolvers/zod";
import type { FieldValues, Resolver } from "react-hook-form";
import type { z } from "zod";

/**
 * Checks a form by the schema of the route that it is sent to. The cast is safe: a form holds looser values than
 * the route takes (any text for a month), the schema says at the field what doesn't fit, and only what it made of
 * them is handed on.
 */
export function routeResolver<Values extends FieldValues>(schema: z.ZodType): Resolver<Values> {
  return zodResolver(schema as z.ZodType<FieldValues, FieldValues>) as unknown as Resolver<Values>;
}
