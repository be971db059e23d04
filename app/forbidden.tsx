import type { Metadata } from "next";
import { LostPage } from "@/app/(public)/_components/lost-page";
import { lostWords } from "@/lib/strings/sign-in";
import "./(public)/public.css";

export const metadata: Metadata = { title: lostWords.forbiddenTitle };

export default function Forbidden() {
  return <LostPage title={lostWords.forbiddenTitle}>{lostWords.forbidden}</LostPage>;
}
