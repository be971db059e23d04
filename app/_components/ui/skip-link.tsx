import { frameWords } from "@/lib/strings/frame";

/** First in the body; the page's main element has the id "main". */
export function SkipLink() {
  return (
    <a className="skip-link" href="#main">
      {frameWords.skipToContent}
    </a>
  );
}
