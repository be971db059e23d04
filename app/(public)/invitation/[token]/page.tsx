import type { Metadata } from "next";
import { PlainPage } from "@/app/(public)/_components/plain-page";
import { PageHead } from "@/app/_components/ui";
import { publicPageCtx } from "@/lib/auth";
import { invitationToken } from "@/lib/schemas/sign-in";
import { findInvitation } from "@/lib/services/people";
import { invitationWords } from "@/lib/strings/sign-in";
import { ChoosePasswordForm } from "./_components/choose-password-form";

// The address is a secret until it is used: it is told to nobody.
export const metadata: Metadata = { title: invitationWords.title, referrer: "no-referrer" };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const token = invitationToken.safeParse((await params).token);
  const open = token.success
    ? await findInvitation({ ctx: await publicPageCtx(), input: { token: token.data } })
    : null;
  if (!open || !token.success) return <Gone />;
  const isFirst = open.email === null;
  return (
    <PlainPage>
      <PageHead
        title={isFirst ? invitationWords.firstHeading : invitationWords.heading(open.name ?? "")}
        subtitle={isFirst ? invitationWords.firstIntro : undefined}
      />
      <ChoosePasswordForm token={token.data} email={open.email} />
    </PlainPage>
  );
}

function Gone() {
  return (
    <PlainPage>
      <PageHead title={invitationWords.goneTitle} />
      <p className="reading">{invitationWords.gone}</p>
    </PlainPage>
  );
}
