import { frameWords } from "@/lib/strings/frame";

/** The wordmark in the text's own colour. Under 60 px high its underline is drawn heavier. */
export function Wordmark({ height = 36 }: { height?: number }) {
  const drawing = height < 60 ? "wordmark-small" : "wordmark";
  return (
    <svg
      viewBox="0 0 292 100"
      width={Math.round(height * 2.92)}
      height={height}
      role="img"
      aria-label={frameWords.product}
    >
      <use href={`/wordmark.svg#${drawing}`} />
    </svg>
  );
}
