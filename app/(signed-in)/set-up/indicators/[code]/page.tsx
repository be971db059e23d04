import type { Metadata } from "next";
import { ButtonLink } from "@/app/_components/ui";
import { forPage } from "@/lib/auth";
import { longMonth } from "@/lib/indicators/chart-format";
import { definitionFor, FROM_THE_BEGINNING } from "@/lib/indicators/definition";
import { monthInZone } from "@/lib/indicators/month";
import { listAssignments } from "@/lib/services/assignments";
import { getHospital } from "@/lib/services/hospital";
import {
  getIndicatorByCode,
  indicatorReply,
  isCounted,
  listSharedDenominators,
} from "@/lib/services/indicators";
import { indicatorWords, teamWords } from "@/lib/strings/indicator-set-up";
import { setUpCtx } from "../../_components/set-up-ctx";
import { SetUpFrame } from "../../_components/set-up-frame";
import { IndicatorEditor } from "../_components/indicator-editor";
import { VersionList } from "../_components/version-list";

export const metadata: Metadata = { title: indicatorWords.caption };

export default async function IndicatorPage({ params }: { params: Promise<{ code: string }> }) {
  const ctx = await setUpCtx("indicator.update");
  const detail = await forPage(getIndicatorByCode({ ctx, code: (await params).code }));
  const indicator = indicatorReply(detail);
  const thisMonth = monthInZone(ctx.now, (await forPage(getHospital({ ctx }))).timeZone);
  const shared = await listSharedDenominators({ ctx });
  const assigned = await listAssignments({ ctx, input: { indicator: indicator.code } });
  const { number, effectiveFrom } = definitionFor(indicator.definitions, thisMonth);
  const since =
    effectiveFrom === FROM_THE_BEGINNING
      ? indicatorWords.sinceBeginning
      : indicatorWords.since(longMonth(effectiveFrom));
  return (
    <SetUpFrame
      ctx={ctx}
      current="indicators"
      title={indicator.name}
      subtitle={`${indicatorWords.headLine(indicator.code, teamWords[indicator.team], assigned.length)} ${indicatorWords.versionLine(number, since)}`}
      parent={{ label: indicatorWords.caption, href: "/set-up/indicators" }}
      actions={
        <ButtonLink href={`/set-up/assignments?indicator=${indicator.code}`}>
          {indicatorWords.assign}
        </ButtonLink>
      }
    >
      <IndicatorEditor
        key={indicator.version}
        indicator={indicator}
        isCounted={await isCounted({ ctx, indicatorId: detail.id })}
        sharedCodes={shared.map(({ code }) => code)}
        aside={<VersionList definitions={indicator.definitions} thisMonth={thisMonth} />}
      />
    </SetUpFrame>
  );
}
