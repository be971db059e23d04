import type { ReactNode } from "react";
import { PageHead, SideNav } from "@/app/_components/ui";
import { listIndicators } from "@/lib/services/indicators";
import { listPeople } from "@/lib/services/people";
import { listWards } from "@/lib/services/wards";
import { setUpWords } from "@/lib/strings/set-up";
import { setUpPages, type SetUpPage } from "./pages";
import type { PageCtx } from "./set-up-ctx";
import "./set-up.css";

interface SetUpFrameProps {
  ctx: PageCtx;
  current: SetUpPage | null;
  title: ReactNode;
  subtitle?: ReactNode;
  actions?: ReactNode;
  /** Page between this one and the start of set-up. */
  parent?: { label: string; href: string };
  children: ReactNode;
}

/** Head and side menu of the set-up pages, with how many there are of each. */
export async function SetUpFrame({
  ctx,
  current,
  title,
  subtitle,
  actions,
  parent,
  children,
}: SetUpFrameProps) {
  const counts: Partial<Record<SetUpPage, number>> = {
    wards: (await listWards({ ctx })).length,
    indicators: (await listIndicators({ ctx })).length,
    people: (await listPeople({ ctx })).length,
  };
  const start = current === null ? [] : [{ label: setUpWords.title, href: "/set-up" }];
  return (
    <>
      <PageHead
        crumbs={[...start, ...(parent ? [parent] : [])]}
        title={title}
        subtitle={subtitle}
        actions={actions}
      />
      <div className="with-side-nav">
        <SideNav
          label={setUpWords.menu}
          items={setUpPages.map(({ name, href }) => ({
            href,
            label: setUpWords[name],
            count: counts[name],
            current: name === current,
          }))}
        />
        <div className="set-up-body">{children}</div>
      </div>
    </>
  );
}
