import type { Metadata } from "next";
import { Link } from "@/app/_components/ui/link";
import { redirect } from "next/navigation";
import { ThemeSwitch, Wordmark } from "@/app/_components/frame";
import { SkipLink } from "@/app/_components/ui";
import { publicPageCtx, safePath } from "@/lib/auth";
import { env } from "@/lib/config/env";
import { getHospitalName } from "@/lib/services/hospital";
import { cautionWords } from "@/lib/strings/cautions";
import { howComputedWords } from "@/lib/strings/how-computed";
import { signInWords } from "@/lib/strings/sign-in";
import { SeaFigure } from "./_components/sea-figure";
import { SignInForm } from "./_components/sign-in-form";

export const metadata: Metadata = { title: signInWords.title };

type Search = Record<string, string | string[] | undefined>;

export default async function SignInPage({ searchParams }: { searchParams: Promise<Search> }) {
  const search = await searchParams;
  const from = safePath(search.from);
  const ctx = await publicPageCtx();
  if (ctx.actor.kind === "person") redirect(from);
  return (
    <>
      <SkipLink />
      <div className="sign-in">
        <main className="sign-in-words" id="main">
          <div>
            <Wordmark height={104} />
            <p className="sign-in-tagline">{signInWords.tagline}</p>
          </div>
          <div>
            <noscript>
              <p className="notice mb-3">{signInWords.needsScript}</p>
            </noscript>
            <SignInForm
              hospitalName={await getHospitalName(ctx)}
              from={from}
              refused={search.error !== undefined}
              isDemo={env().EBBLINE_DEMO === "1"}
            />
          </div>
          <SignInFoot />
        </main>
        <SeaFigure />
      </div>
    </>
  );
}

function SignInFoot() {
  return (
    <div className="sign-in-foot">
      <p>
        <b>{cautionWords.countsOnlyTitle}</b> {cautionWords.countsOnly}
      </p>
      <p className="care">
        {cautionWords.lead} {cautionWords.urgent}
      </p>
      <div className="footer-links">
        <Link href="/cautions">{cautionWords.link}</Link>
        <Link href="/how-computed">{howComputedWords.link}</Link>
        <ThemeSwitch />
      </div>
    </div>
  );
}
