"use client";

import { usePathname } from "next/navigation";
import { Masthead } from "@/app/_components/frame";
import { SignOut } from "./sign-out";

interface SignedInMastheadProps {
  hospitalName: string;
  personName: string;
  roleName: string;
  links: { href: string; label: string }[];
  returnMonth: number;
}

/** Pages that stand under another area's link. */
const UNDER: Record<string, string> = { "/people": "/set-up" };

/** The masthead, with the link of the area that the reader is in marked. */
export function SignedInMasthead({ links, ...rest }: SignedInMastheadProps) {
  const path = usePathname();
  const area = `/${path.split("/")[1] ?? ""}`;
  const current = UNDER[area] ?? area;
  return (
    <Masthead
      {...rest}
      links={links.map((link) => ({ ...link, current: link.href === current }))}
      signOut={<SignOut />}
    />
  );
}
