import type { Ctx } from "@/db/transaction";
import { createIndicatorSchema } from "@/lib/schemas/indicator";
import { setAssignment } from "@/lib/services/assignments";
import { getHospital, setUpHospital, updateHospital } from "@/lib/services/hospital";
import { createIndicator } from "@/lib/services/indicators";
import { createWard } from "@/lib/services/wards";
import { demoIndicators, demoWards, hospitalName, reports, timeZone } from "./hospital";
import { FIRST_BACK } from "./story";
import type { Stage } from "./stage";

const DUE_DAY = 7;

/** Hospital, wards, indicators, and who reports what. */
export async function setUpHarrowmere(ctx: Ctx, stage: Stage): Promise<void> {
  await setUpHospital({ ctx, input: { name: hospitalName, timeZone } });
  const { version, holidays } = await getHospital({ ctx });
  await updateHospital({ ctx, input: { name: hospitalName, timeZone, dueDay: DUE_DAY, holidays, version } });

  const first = stage.month(FIRST_BACK);
  for (const { code, name, division } of demoWards) {
    await createWard({ ctx, input: { code, name, division, openFrom: first, openTo: null } });
  }
  for (const indicator of demoIndicators) {
    await createIndicator({ ctx, input: createIndicatorSchema.parse(indicator) });
  }
  for (const ward of demoWards) {
    for (const indicator of demoIndicators.filter((each) => reports(each, ward))) {
      const input = { ward: ward.code, indicator: indicator.code, from: first, to: null };
      await setAssignment({ ctx, input });
    }
  }
}
