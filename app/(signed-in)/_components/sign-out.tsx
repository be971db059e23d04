"use client";

import { signOut } from "next-auth/react";
import { useState } from "react";
import { frameWords } from "@/lib/strings/frame";

/** Ends the session on the server; the page is then loaded anew, so that nothing stays in the tab. */
export function SignOut() {
  const [isLeaving, setIsLeaving] = useState(false);

  async function leave() {
    setIsLeaving(true);
    await signOut({ redirect: false }).catch(() => null);
    // eslint-disable-next-line @next/next/no-location-assign-relative-destination -- a new document, on purpose
    window.location.assign("/sign-in");
  }

  return (
    <button type="button" disabled={isLeaving} onClick={() => void leave()}>
      {frameWords.signOut}
    </button>
  );
}
