import type { Metadata } from "next";
import { ButtonLink } from "@/app/_components/ui";
import { forPage } from "@/lib/auth";
import { wardSchema } from "@/lib/schemas/ward";
import { getWardByCode } from "@/lib/services/wards";
import { setUpWords, wardWords } from "@/lib/strings/set-up";
import { setUpCtx } from "../../_components/set-up-ctx";
import { SetUpFrame } from "../../_components/set-up-frame";
import { WardForm } from "../_components/ward-form";

export const metadata: Metadata = { title: setUpWords.wards };

export default async function WardPage({ params }: { params: Promise<{ code: string }> }) {
  const ctx = await setUpCtx("ward.update");
  const ward = wardSchema.parse(await forPage(getWardByCode({ ctx, code: (await params).code })));
  const parent = { label: setUpWords.wards, href: "/set-up/wards" };
  const actions = <ButtonLink href={`/set-up/assignments?ward=${ward.code}`}>{wardWords.reports}</ButtonLink>;
  return (
    <SetUpFrame
      ctx={ctx}
      current="wards"
      title={ward.name}
      subtitle={wardWords.editNote(ward.code)}
      parent={parent}
      actions={actions}
    >
      <WardForm key={ward.version} ward={ward} />
    </SetUpFrame>
  );
}
