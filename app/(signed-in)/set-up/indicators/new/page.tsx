import type { Metadata } from "next";
import { listSharedDenominators } from "@/lib/services/indicators";
import { indicatorWords } from "@/lib/strings/indicator-set-up";
import { setUpCtx } from "../../_components/set-up-ctx";
import { SetUpFrame } from "../../_components/set-up-frame";
import { IndicatorEditor } from "../_components/indicator-editor";

export const metadata: Metadata = { title: indicatorWords.newTitle };

export default async function NewIndicatorPage() {
  const ctx = await setUpCtx("indicator.create");
  const shared = await listSharedDenominators({ ctx });
  const parent = { label: indicatorWords.caption, href: "/set-up/indicators" };
  return (
    <SetUpFrame ctx={ctx} current="indicators" title={indicatorWords.newTitle} parent={parent}>
      <IndicatorEditor indicator={null} isCounted={false} sharedCodes={shared.map(({ code }) => code)} />
    </SetUpFrame>
  );
}
