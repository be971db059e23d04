import type { Ink } from "@/lib/scene/pens";

/** Class of each colour, written out in full so that the style sheet's builder finds them. */
export const strokeClass: Record<Ink, string> = {
  ink: "stroke-ink",
  ink2: "stroke-ink2",
  edge: "stroke-edge",
  channel: "stroke-channel",
  over: "stroke-over",
  hair: "stroke-hair",
  rule: "stroke-rule",
  sheet: "stroke-sheet",
};

export const fillClass: Record<Ink, string> = {
  ink: "fill-ink",
  ink2: "fill-ink2",
  edge: "fill-edge",
  channel: "fill-channel",
  over: "fill-over",
  hair: "fill-hair",
  rule: "fill-rule",
  sheet: "fill-sheet",
};
