"use client";

import { useState } from "react";
import { Button, Notice, TextInput } from "@/app/_components/ui";
import { peopleWords } from "@/lib/strings/people";

/** A link that is shown this once. */
export function LinkOnce({ name, link }: { name: string; link: string }) {
  const [isCopied, setIsCopied] = useState(false);

  async function copy() {
    // Refused without https on other computers than this one: the text can still be marked by hand.
    await navigator.clipboard?.writeText(link).then(
      () => setIsCopied(true),
      () => undefined,
    );
  }

  return (
    <Notice title={`${peopleWords.linkTitle(name)}.`} live="status" className="mb-3">
      {peopleWords.linkNote}
      <div className="link-once">
        <TextInput
          id="link-once"
          label={<span className="sr-only">{peopleWords.linkLabel}</span>}
          readOnly
          value={link}
          size={Math.min(link.length, 80)}
          onFocus={(event) => event.target.select()}
        />
        <Button onClick={() => void copy()}>{isCopied ? peopleWords.copied : peopleWords.copy}</Button>
      </div>
    </Notice>
  );
}
