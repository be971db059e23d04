import { route } from "@/lib/http";
import { annotationSchema, createAnnotationSchema } from "@/lib/schemas/annotation";
import { createAnnotation } from "@/lib/services/annotations";

export const POST = route({
  summary: "Set a note on one month of a chart; no patient details",
  body: createAnnotationSchema,
  response: annotationSchema,
  status: 201,
  run: ({ ctx, body }) => createAnnotation({ ctx, input: body }),
});
