import { route } from "@/lib/http";
import { assignmentParams, assignmentSchema, setAssignmentSchema } from "@/lib/schemas/assignment";
import { setAssignment } from "@/lib/services/assignments";

export const PUT = route({
  summary: "Say from which month to which a ward reports an indicator",
  params: assignmentParams,
  body: setAssignmentSchema,
  response: assignmentSchema,
  run: ({ ctx, params, body }) => setAssignment({ ctx, input: { ...body, ...params } }),
});
