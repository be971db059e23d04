"use client";

import { primitiveWords } from "@/lib/strings/frame";
import { lostWords } from "@/lib/strings/sign-in";
import "./globals.css";
import "./(public)/public.css";

/** Stands in for the whole document where even its frame failed: no parts that may fail again. */
export default function GlobalError({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en-GB">
      <head>
        <title>{lostWords.errorTitle}</title>
      </head>
      <body>
        <main className="page-body" id="main">
          <h1>{lostWords.errorTitle}</h1>
          <p className="reading">
            {lostWords.error} {error.digest ? primitiveWords.reference(error.digest) : null}
          </p>
          {/* A plain link: the page is loaded anew, with everything that failed: the router may be part of it. */}
          {/* eslint-disable-next-line @next/next/no-html-link-for-pages -- the page must load anew */}
          <a href="/">{lostWords.toMyPage}</a>
        </main>
      </body>
    </html>
  );
}
