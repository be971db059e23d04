import { config } from "zod/v4/core";

// Runs in the browser before anything else: zod otherwise tries `eval`, which the content policy reports.
config({ jitless: true });
