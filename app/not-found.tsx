import type { Metadata } from "next";
import { LostPage } from "@/app/(public)/_components/lost-page";
import { lostWords } from "@/lib/strings/sign-in";
import "./(public)/public.css";

export const metadata: Metadata = { title: lostWords.notFoundTitle };

export default function NotFound() {
  return <LostPage title={lostWords.notFoundTitle}>{lostWords.notFound}</LostPage>;
}
