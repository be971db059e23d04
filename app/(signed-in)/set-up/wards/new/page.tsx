import type { Metadata } from "next";
import { setUpWords, wardWords } from "@/lib/strings/set-up";
import { setUpCtx } from "../../_components/set-up-ctx";
import { SetUpFrame } from "../../_components/set-up-frame";
import { WardForm } from "../_components/ward-form";

export const metadata: Metadata = { title: wardWords.newTitle };

export default async function NewWardPage() {
  const ctx = await setUpCtx("ward.create");
  const parent = { label: setUpWords.wards, href: "/set-up/wards" };
  return (
    <SetUpFrame ctx={ctx} current="wards" title={wardWords.newTitle} parent={parent}>
      <WardForm ward={null} />
    </SetUpFrame>
  );
}
