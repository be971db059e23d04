"use client";

import { LostPage } from "@/app/(public)/_components/lost-page";
import { Button } from "@/app/_components/ui";
import { primitiveWords } from "@/lib/strings/frame";
import { lostWords } from "@/lib/strings/sign-in";
import "./(public)/public.css";

export default function PageError({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <LostPage
      title={lostWords.errorTitle}
      action={
        <Button look="primary" onClick={reset}>
          {lostWords.again}
        </Button>
      }
    >
      {lostWords.error} {error.digest ? primitiveWords.reference(error.digest) : null}
    </LostPage>
  );
}
