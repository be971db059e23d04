import { z } from "zod";
import { tallyReplySchema, type TallyReply } from "@/lib/schemas/tally";
import { wardReturnSchema, type WardReturnReply } from "@/lib/schemas/ward-return";
import type { HttpClient, Reply } from "./http-client";

/** A return as one client sees and changes it over HTTP. */
export class ReturnClient {
  constructor(
    private readonly client: HttpClient,
    readonly ward: string,
    readonly month: string,
  ) {}

  private get path(): string {
    return `/api/returns/${this.ward}/${this.month}`;
  }

  async read(): Promise<WardReturnReply> {
    return wardReturnSchema.parse((await this.client.get(this.path)).body);
  }

  async line(indicator: string): Promise<TallyReply> {
    const line = (await this.read()).tallies.find((each) => each.indicator === indicator);
    if (!line) throw new Error(`${this.ward} doesn't report ${indicator} in ${this.month}.`);
    return line;
  }

  save(indicator: string, body: Record<string, unknown>): Promise<Reply> {
    return this.client.put(`${this.path}/tallies/${indicator}`, body);
  }

  /** A save that must be taken; answers the line after it. */
  async saved(indicator: string, body: Record<string, unknown>): Promise<TallyReply> {
    const reply = await this.save(indicator, body);
    if (reply.status !== 200) throw new Error(`${indicator} wasn't saved: ${JSON.stringify(reply.body)}`);
    return tallyReplySchema.parse(reply.body);
  }

  step(
    name: "submission" | "recall" | "acceptance" | "reopening" | "corrections",
    body: unknown = {},
  ): Promise<Reply> {
    return this.client.post(`${this.path}/${name}`, body);
  }

  /** Answers every line that holds the sending back, with figures that can be. */
  async fill(): Promise<void> {
    for (const { indicator } of (await this.read()).tallies) {
      // Read again each time: a shared denominator may have come with a line before.
      const { numeratorBy, numerator, denominator, version, denominatorVersion } = await this.line(indicator);
      const body = {
        ...(numeratorBy === "ward" && numerator === null ? { numerator: 4 } : {}),
        ...(denominator === null ? { denominator: 640, denominatorVersion } : {}),
        version,
      };
      if (Object.keys(body).length > 1) await this.saved(indicator, body);
    }
  }
}

const problem = z.object({
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  current: z.unknown().optional(),
});

/** Paths of the fields that a refusal names. */
export function pathsOf(reply: Reply): string[] {
  return (problem.parse(reply.body).errors ?? []).map(({ path }) => path);
}

/** The line as it stands, which a refusal for staleness carries. */
export function currentLine(reply: Reply): TallyReply {
  return tallyReplySchema.parse(problem.parse(reply.body).current);
}
