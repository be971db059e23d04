import type { Metadata } from "next";
import { forPage } from "@/lib/auth";
import { getHospital } from "@/lib/services/hospital";
import { hospitalWords, setUpWords } from "@/lib/strings/set-up";
import { setUpCtx } from "../_components/set-up-ctx";
import { SetUpFrame } from "../_components/set-up-frame";
import { HospitalForm } from "./_components/hospital-form";

export const metadata: Metadata = { title: setUpWords.hospital };

export default async function HospitalPage() {
  const ctx = await setUpCtx("settings.update");
  const hospital = await forPage(getHospital({ ctx }));
  return (
    <SetUpFrame ctx={ctx} current="hospital" title={setUpWords.hospital} subtitle={hospitalWords.subtitle}>
      <HospitalForm key={hospital.version} hospital={hospital} />
    </SetUpFrame>
  );
}
