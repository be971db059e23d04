import { Link } from "@/app/_components/ui/link";
import type { ReactNode } from "react";
import { Footer, Wordmark } from "@/app/_components/frame";
import { SkipLink } from "@/app/_components/ui";
import { cautionWords } from "@/lib/strings/cautions";
import { frameWords } from "@/lib/strings/frame";
import { howComputedWords } from "@/lib/strings/how-computed";

/** A page that needs nobody signed in: the wordmark, the words, the cautions. */
export function PlainPage({ children }: { children: ReactNode }) {
  return (
    <>
      <SkipLink />
      <header className="plain-head">
        <Link className="brand" href="/" aria-label={frameWords.startPage}>
          <Wordmark />
        </Link>
      </header>
      <main className="page-body" id="main">
        {children}
      </main>
      <Footer
        links={[
          { href: "/cautions", label: cautionWords.link },
          { href: "/how-computed", label: howComputedWords.link },
        ]}
      />
    </>
  );
}
