import type { Metadata } from "next";
import { Link } from "@/app/_components/ui/link";
import { Notice } from "@/app/_components/ui";
import { listAssignments } from "@/lib/services/assignments";
import { listIndicators } from "@/lib/services/indicators";
import { listWards } from "@/lib/services/wards";
import { setUpWords } from "@/lib/strings/set-up";
import { setUpPages, type SetUpPage } from "./_components/pages";
import { setUpCtx, type PageCtx } from "./_components/set-up-ctx";
import { SetUpFrame } from "./_components/set-up-frame";

export const metadata: Metadata = { title: setUpWords.title };

export default async function SetUpStartPage() {
  const ctx = await setUpCtx("settings.update");
  const next = await nextStep(ctx);
  return (
    <SetUpFrame ctx={ctx} current={null} title={setUpWords.title} subtitle={setUpWords.subtitle}>
      {next ? (
        <Notice className="mb-3">
          <Link href={next.href}>{setUpWords.startWith(setUpWords[next.name])}</Link>
        </Notice>
      ) : null}
      <ul className="ruled-list">
        {setUpPages.map(({ name, href }) => (
          <li key={name}>
            <Link href={href}>
              <b>{setUpWords[name]}</b>
            </Link>{" "}
            {setUpWords.about[name]}
          </li>
        ))}
      </ul>
    </SetUpFrame>
  );
}

/** What a hospital without counts needs first; null once something can be counted. */
async function nextStep(ctx: PageCtx): Promise<{ name: SetUpPage; href: string } | null> {
  const stepOf = (name: SetUpPage) => setUpPages.find((page) => page.name === name) ?? null;
  if ((await listWards({ ctx })).length === 0) return stepOf("wards");
  if ((await listIndicators({ ctx })).length === 0) return stepOf("indicators");
  if ((await listAssignments({ ctx, input: {} })).length === 0) return stepOf("assignments");
  return null;
}
