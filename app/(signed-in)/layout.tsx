import type { ReactNode } from "react";
import { Footer } from "@/app/_components/frame";
import { SkipLink } from "@/app/_components/ui";
import { publicPageCtx } from "@/lib/auth";
import { addMonths, monthInZone } from "@/lib/indicators/month";
import { findHospitalRow } from "@/lib/services/hospital";
import { cautionWords } from "@/lib/strings/cautions";
import { howComputedWords } from "@/lib/strings/how-computed";
import { roleWords } from "@/lib/strings/people";
import { linksFor } from "./_components/links";
import { SignedInMasthead } from "./_components/signed-in-masthead";

/** The frame round every page of somebody signed in. It decides nothing: each page asks for its own ctx. */
export default async function SignedInLayout({ children }: { children: ReactNode }) {
  const ctx = await publicPageCtx();
  if (ctx.actor.kind !== "person") return children;
  const hospital = await findHospitalRow(ctx);
  const returnMonth = addMonths(monthInZone(ctx.now, hospital?.timeZone ?? "UTC"), -1);
  return (
    <>
      <SkipLink />
      <SignedInMasthead
        hospitalName={hospital?.name ?? ""}
        personName={ctx.actor.name}
        roleName={roleWords[ctx.actor.role].inLine}
        links={linksFor(ctx.actor)}
        returnMonth={Number(returnMonth.slice(5, 7))}
      />
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
