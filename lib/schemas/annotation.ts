import { z } from "zod";
import { code, month, text } from "./common";

export const createAnnotationSchema = z.object({
  ward: code,
  indicator: code,
  month,
  text: text(300, "Write the note."),
});
export type CreateAnnotation = z.output<typeof createAnnotationSchema>;

export const annotationSchema = z.object({
  id: z.string(),
  ward: z.string(),
  indicator: z.string(),
  month,
  text: z.string(),
  createdBy: z.string(),
  createdAt: z.iso.datetime(),
});
export type AnnotationReply = z.infer<typeof annotationSchema>;
