import type { Metadata } from "next";
import type { ReactNode } from "react";
import { forPage } from "@/lib/auth";
import { longMonth } from "@/lib/indicators/chart-format";
import { assignmentReply, listAssignments } from "@/lib/services/assignments";
import { getIndicatorByCode, listIndicators } from "@/lib/services/indicators";
import { getWardByCode, listWards } from "@/lib/services/wards";
import { assignmentWords, setUpWords, wardWords } from "@/lib/strings/set-up";
import { setUpCtx, type PageCtx } from "../_components/set-up-ctx";
import { SetUpFrame } from "../_components/set-up-frame";
import { AssignmentList, type AssignmentLine } from "./_components/assignment-list";
import { Chooser } from "./_components/chooser";

export const metadata: Metadata = { title: setUpWords.assignments };

interface AssignmentsPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function AssignmentsPage({ searchParams }: AssignmentsPageProps) {
  const ctx = await setUpCtx("assignment.set");
  const { ward, indicator } = await searchParams;
  if (typeof ward === "string") return framed(ctx, await ofWard(ctx, ward), chooserPage);
  if (typeof indicator === "string") return framed(ctx, await ofIndicator(ctx, indicator), chooserPage);
  return framed(ctx, await choose(ctx));
}

const chooserPage = { label: setUpWords.assignments, href: "/set-up/assignments" };

function framed(ctx: PageCtx, content: ReactNode, parent?: typeof chooserPage) {
  return (
    <SetUpFrame
      ctx={ctx}
      current="assignments"
      title={setUpWords.assignments}
      subtitle={assignmentWords.subtitle}
      parent={parent}
    >
      {content}
    </SetUpFrame>
  );
}

async function ofWard(ctx: PageCtx, code: string) {
  const ward = await forPage(getWardByCode({ ctx, code }));
  const rows = await listAssignments({ ctx, input: { ward: ward.code } });
  const lines: AssignmentLine[] = (await listIndicators({ ctx })).map((indicator) => {
    const row = rows.find((each) => each.indicatorId === indicator.id);
    return { ward, indicator, assignment: row ? assignmentReply(row, row) : null };
  });
  const range = wardWords.openRange(longMonth(ward.openFrom), ward.openTo && longMonth(ward.openTo));
  return (
    <AssignmentList
      title={assignmentWords.wardTitle(ward.name)}
      note={assignmentWords.wardNote(range)}
      rowsAre="indicators"
      lines={lines.map(plainLine)}
    />
  );
}

async function ofIndicator(ctx: PageCtx, code: string) {
  const indicator = await forPage(getIndicatorByCode({ ctx, code }));
  const rows = await listAssignments({ ctx, input: { indicator: indicator.code } });
  const lines: AssignmentLine[] = (await listWards({ ctx })).map((ward) => {
    const row = rows.find((each) => each.wardId === ward.id);
    return { ward, indicator, assignment: row ? assignmentReply(row, row) : null };
  });
  return (
    <AssignmentList
      title={assignmentWords.indicatorTitle(indicator.name)}
      rowsAre="wards"
      lines={lines.map(plainLine)}
    />
  );
}

async function choose(ctx: PageCtx) {
  const rows = await listAssignments({ ctx, input: {} });
  const wards = await listWards({ ctx });
  const indicators = await listIndicators({ ctx });
  return (
    <>
      <p className="mb-3">{assignmentWords.choose}</p>
      <div className="form-pair">
        <Chooser
          title={assignmentWords.byWard}
          side="ward"
          choices={wards.map(({ code, name }) => ({ code, name }))}
          counts={countBy(rows.map((row) => row.ward))}
          empty={assignmentWords.noWards}
        />
        <Chooser
          title={assignmentWords.byIndicator}
          side="indicator"
          choices={indicators.map(({ code, name }) => ({ code, name }))}
          counts={countBy(rows.map((row) => row.indicator))}
          empty={assignmentWords.noIndicators}
        />
      </div>
    </>
  );
}

/** Only what the browser needs: records carry more than a page should send. */
function plainLine({ ward, indicator, assignment }: AssignmentLine): AssignmentLine {
  const { code, name, openFrom, openTo } = ward;
  return {
    ward: { code, name, openFrom, openTo },
    indicator: { code: indicator.code, name: indicator.name },
    assignment,
  };
}

function countBy(codes: string[]): Map<string, number> {
  const counts = new Map<string, number>();
  for (const code of codes) counts.set(code, (counts.get(code) ?? 0) + 1);
  return counts;
}
