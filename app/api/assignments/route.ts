import { route } from "@/lib/http";
import { assignmentListSchema, assignmentQuery } from "@/lib/schemas/assignment";
import { assignmentReply, listAssignments } from "@/lib/services/assignments";

export const GET = route({
  summary: "Which ward reports which indicator, narrowed to a ward or an indicator",
  query: assignmentQuery,
  response: assignmentListSchema,
  run: async ({ ctx, query }) => {
    const rows = await listAssignments({ ctx, input: query });
    return { items: rows.map((row) => assignmentReply(row, row)), nextCursor: null };
  },
});
