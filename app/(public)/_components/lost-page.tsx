import type { ReactNode } from "react";
import { ButtonLink, PageHead } from "@/app/_components/ui";
import { lostWords } from "@/lib/strings/sign-in";
import { PlainPage } from "./plain-page";

/** A page that says why there is nothing to see, and leads back. */
export function LostPage({
  title,
  children,
  action,
}: {
  title: string;
  children: ReactNode;
  action?: ReactNode;
}) {
  return (
    <PlainPage>
      <PageHead title={title} />
      <div className="reading">
        <p>{children}</p>
        <div className="actions mt-4">
          {action}
          <ButtonLink href="/">{lostWords.toMyPage}</ButtonLink>
        </div>
      </div>
    </PlainPage>
  );
}
