import { route } from "@/lib/http";
import { signalPageSchema, signalQuery } from "@/lib/schemas/signal";
import { listSignals } from "@/lib/services/signals";

export const GET = route({
  summary: "Signals, newest first",
  query: signalQuery,
  response: signalPageSchema,
  run: ({ ctx, query }) => listSignals({ ctx, input: query }),
});
