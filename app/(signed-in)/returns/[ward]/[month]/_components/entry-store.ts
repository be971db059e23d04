import type { ApiProblem, Sent } from "@/app/_hooks/use-api";
import { readCount } from "@/lib/indicators/return-entry";
import type { TallyReply } from "@/lib/schemas/tally";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { checkWords } from "@/lib/strings/returns";
import {
  draftKey,
  lineOf,
  pairProblem,
  parts,
  withTally,
  without,
  type Draft,
  type EntryState,
  type Part,
} from "./entry-state";

/** Fields of a save; the store adds the versions that it knows. */
export interface TallyFields {
  numerator?: number | null;
  denominator?: number | null;
  notCollected?: string | null;
  awaited?: string | null;
  note?: string | null;
}

interface SaveChoice {
  also?: Draft["state"];
  only?: readonly Part[];
}

export type SendTally = (indicator: string, body: unknown) => Promise<Sent<TallyReply>>;

/**
 * What is typed on the page of one return and how it is saved: one box at a time, in order, each on the version that
 * the last reply gave. What can't be stays here until it is mended; what failed stays until it is sent again.
 */
export class EntryStore {
  private state: EntryState;
  private readonly listeners = new Set<() => void>();
  private queue: Promise<void> = Promise.resolve();

  constructor(
    initial: WardReturnReply,
    private readonly send: SendTally,
  ) {
    this.state = { wardReturn: initial, drafts: {}, savedAt: {}, failure: null };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly snapshot = (): EntryState => this.state;

  /** Settles when everything asked for so far has been answered. */
  settled(): Promise<void> {
    return this.queue;
  }

  private change(values: Partial<EntryState>): void {
    this.state = { ...this.state, ...values };
    for (const listener of this.listeners) listener();
  }

  private setDraft(indicator: string, part: Part, draft: Draft): void {
    this.change({ drafts: { ...this.state.drafts, [draftKey(indicator, part)]: draft } });
  }

  private drop(indicator: string, which: readonly Part[] = parts): void {
    const keys = which.map((part) => draftKey(indicator, part));
    this.change({ drafts: without(this.state.drafts, keys) });
  }

  type(indicator: string, part: Part, text: string): void {
    this.setDraft(indicator, part, { text, state: "dirty" });
  }

  /** Escape: the last saved value again. */
  putBack(indicator: string, part: Part): void {
    this.drop(indicator, [part]);
  }

  /** On leaving a box: says what is wrong with it, or saves the line's boxes. */
  leave(indicator: string, part: Part): void {
    const draft = this.state.drafts[draftKey(indicator, part)];
    if (draft?.state !== "dirty") return;
    const read = readCount(draft.text);
    if (!read.ok) {
      this.setDraft(indicator, part, { ...draft, state: "fix", message: checkWords.wholeNumber });
      return;
    }
    if (read.value === lineOf(this.state, indicator)[part]) this.drop(indicator, [part]);
    this.saveLine(indicator);
  }

  swap(indicator: string): void {
    const line = lineOf(this.state, indicator);
    const text = (part: Part) =>
      this.state.drafts[draftKey(indicator, part)]?.text ?? String(line[part] ?? "");
    const [numerator, denominator] = [text("denominator"), text("numerator")];
    this.type(indicator, "numerator", numerator);
    this.type(indicator, "denominator", denominator);
    this.saveLine(indicator);
  }

  /** The other version has been seen: the typed value is saved over it. */
  keepMine(indicator: string): void {
    this.saveLine(indicator, { also: "conflict" });
  }

  useTheirs(indicator: string): void {
    this.drop(indicator);
  }

  /** What failed for want of a connection. */
  saveAgain(): void {
    const failed = Object.entries(this.state.drafts).filter(([, draft]) => draft.state === "failed");
    for (const indicator of new Set(failed.map(([key]) => key.split(" ")[0] ?? ""))) this.saveLine(indicator);
  }

  /** Answers that aren't counts, and notes. What went wrong is the caller's to show. */
  async saveAnswer(indicator: string, fields: TallyFields): Promise<ApiProblem | null> {
    let problem: ApiProblem | null = null;
    await this.enqueue(async () => {
      const sent = await this.put(indicator, fields);
      if (sent.ok) {
        this.take(indicator, sent.data);
        this.drop(indicator);
        return;
      }
      problem = sent.problem;
      if (isTally(problem.current)) {
        this.change({ wardReturn: withTally(this.state.wardReturn, problem.current) });
      }
    });
    return problem;
  }

  /** A newer state of the whole return; drafts stay. */
  receive(wardReturn: WardReturnReply): void {
    this.change({ wardReturn });
  }

  private enqueue(work: () => Promise<void>): Promise<void> {
    this.queue = this.queue.then(work);
    return this.queue;
  }

  private put(indicator: string, fields: TallyFields): Promise<Sent<TallyReply>> {
    const { version, denominatorVersion } = lineOf(this.state, indicator);
    return this.send(indicator, { ...fields, version, denominatorVersion });
  }

  private saveLine(indicator: string, { also, only = parts }: SaveChoice = {}): void {
    const line = lineOf(this.state, indicator);
    const states: readonly (Draft["state"] | undefined)[] = ["dirty", "failed", "fix", also];
    const saving = only.flatMap((part) => {
      const draft = this.state.drafts[draftKey(indicator, part)];
      const read = draft && states.includes(draft.state) ? readCount(draft.text) : null;
      return draft && read?.ok ? [{ part, text: draft.text, value: read.value }] : [];
    });
    if (saving.length === 0) return;
    const isImpossible = pairProblem(line, this.state.drafts) !== null;
    for (const { part, text } of saving) {
      this.setDraft(indicator, part, { text, state: isImpossible ? "fix" : "saving" });
    }
    if (isImpossible) return;
    const fields = Object.fromEntries(saving.map(({ part, value }) => [part, value]));
    void this.enqueue(async () => {
      const before = lineOf(this.state, indicator);
      const sent = await this.put(indicator, fields);
      if (sent.ok) this.saved(indicator, sent.data);
      else this.refused(before, sent.problem);
    });
  }

  private saved(indicator: string, fresh: TallyReply): void {
    this.take(indicator, fresh);
    this.drop(
      indicator,
      parts.filter((part) => this.isSaving(indicator, part)),
    );
    // A new shared denominator may have mended what stood in another line.
    for (const line of this.state.wardReturn.tallies) {
      const shares = line.sharedDenominator !== null && line.sharedDenominator === fresh.sharedDenominator;
      const waits = this.state.drafts[draftKey(line.indicator, "numerator")];
      if (shares && line.indicator !== indicator && waits?.state === "fix") this.saveLine(line.indicator);
    }
  }

  private take(indicator: string, fresh: TallyReply): void {
    this.change({
      wardReturn: withTally(this.state.wardReturn, fresh),
      savedAt: { ...this.state.savedAt, [indicator]: lastSaved(fresh) },
      failure: null,
    });
  }

  private isSaving(indicator: string, part: Part): boolean {
    return this.state.drafts[draftKey(indicator, part)]?.state === "saving";
  }

  private refused(before: TallyReply, problem: ApiProblem): void {
    const { indicator } = before;
    const waiting = parts.filter((part) => this.isSaving(indicator, part));
    if (isTally(problem.current)) return this.stale(before, problem.current, waiting);
    const text = (part: Part) => this.state.drafts[draftKey(indicator, part)]?.text ?? "";
    if (problem.status !== 422) {
      this.change({ failure: problem.detail });
      for (const part of waiting) this.setDraft(indicator, part, { text: text(part), state: "failed" });
      return;
    }
    const complaint = (part: Part) => problem.errors?.find((error) => error.path === part)?.message;
    const isNamed = waiting.some((part) => complaint(part) !== undefined);
    for (const part of waiting) {
      const message = complaint(part) ?? (isNamed ? null : problem.detail);
      if (message !== null) this.setDraft(indicator, part, { text: text(part), state: "fix", message });
      // What the refusal doesn't speak of is saved by itself.
      else this.type(indicator, part, text(part));
    }
    const others = waiting.filter((part) => this.state.drafts[draftKey(indicator, part)]?.state === "dirty");
    this.saveLine(indicator, { only: others });
  }

  /** A box that somebody else moved asks which value is right; one that stood still is saved again. */
  private stale(before: TallyReply, current: TallyReply, waiting: readonly Part[]): void {
    const { indicator } = before;
    this.change({ wardReturn: withTally(this.state.wardReturn, current) });
    for (const part of waiting) {
      const text = this.state.drafts[draftKey(indicator, part)]?.text ?? "";
      const hasMoved = before[part] !== current[part];
      this.setDraft(indicator, part, { text, state: hasMoved ? "conflict" : "dirty" });
    }
    this.saveLine(indicator);
  }
}

/** The later of the two rows' instants; ISO text in UTC compares as time. */
function lastSaved({ savedAt, denominatorSavedAt }: TallyReply): string {
  const [own, shared] = [savedAt ?? "", denominatorSavedAt ?? ""];
  return own > shared ? own : shared;
}

/** Safe because only the route of one line answers with such a record. */
function isTally(value: unknown): value is TallyReply {
  return typeof value === "object" && value !== null && "indicator" in value && "numerator" in value;
}
