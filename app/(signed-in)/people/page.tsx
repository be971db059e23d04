import type { Metadata } from "next";
import { PageHead } from "@/app/_components/ui";
import { forPage, pageCtx } from "@/lib/auth";
import { listPeople } from "@/lib/services/people";
import { listWards } from "@/lib/services/wards";
import { peopleWords } from "@/lib/strings/people";
import { PeopleDesk } from "./_components/people-desk";
import "./people.css";

export const metadata: Metadata = { title: peopleWords.title };

export default async function PeoplePage() {
  const ctx = await pageCtx();
  const people = await forPage(listPeople({ ctx }));
  const wards = await forPage(listWards({ ctx }));
  const invited = people.filter((person) => person.state === "invited").length;
  return (
    <>
      <PageHead
        crumbs={[{ label: peopleWords.setUp, href: "/set-up" }]}
        title={peopleWords.title}
        subtitle={peopleWords.subtitle(people.length, invited)}
      />
      <PeopleDesk people={people} wards={wards.map(({ code, name }) => ({ code, name }))} />
    </>
  );
}
