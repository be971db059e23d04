import { z } from "zod";
import { route } from "@/lib/http";

export const GET = route({
  summary: "Whether Ebbline answers, and nothing else about it",
  openToAnyone: true,
  response: z.object({ status: z.literal("ok") }),
  run: async () => ({ status: "ok" as const }),
});
