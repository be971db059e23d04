"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, Notice } from "@/app/_components/ui";
import type { PersonRecord } from "@/lib/schemas/person";
import { peopleWords } from "@/lib/strings/people";
import { EditPerson } from "./edit-person";
import { InvitePerson } from "./invite-person";
import { LinkOnce } from "./link-once";
import { PeopleTable } from "./people-table";

export interface WardChoice {
  code: string;
  name: string;
}

export interface MadeLink {
  name: string;
  link: string;
}

/** Who is open beside the table: somebody by id, somebody new, or nobody. */
type Open = { id: string } | "new" | null;

export function PeopleDesk({ people, wards }: { people: PersonRecord[]; wards: WardChoice[] }) {
  const router = useRouter();
  const [open, setOpen] = useState<Open>(null);
  const [madeLink, setMadeLink] = useState<MadeLink | null>(null);
  const [stale, setStale] = useState<string | null>(null);
  const person = open !== null && open !== "new" ? people.find(({ id }) => id === open.id) : undefined;

  function done(link: MadeLink | null) {
    setMadeLink(link);
    setStale(null);
    setOpen(null);
    router.refresh();
  }

  return (
    <>
      <div className="actions mb-3">
        <Button look="primary" onClick={() => setOpen("new")}>
          {peopleWords.invite}
        </Button>
      </div>
      {madeLink ? <LinkOnce {...madeLink} /> : null}
      {stale ? (
        <Notice mark="conflict" live="alert" className="mb-3" title={`${peopleWords.staleTitle}.`}>
          {peopleWords.stale(stale)}
        </Notice>
      ) : null}
      <div className={open === null ? undefined : "with-aside"}>
        <PeopleTable people={people} wards={wards} openId={person?.id} onEdit={(id) => setOpen({ id })} />
        {open === "new" ? <InvitePerson wards={wards} onDone={done} onCancel={() => setOpen(null)} /> : null}
        {person ? (
          <EditPerson
            // A newer version is another form: nothing typed over the old one is kept by accident.
            key={`${person.id} ${person.version}`}
            person={person}
            wards={wards}
            onDone={done}
            onStale={(name) => {
              setStale(name);
              router.refresh();
            }}
            onCancel={() => setOpen(null)}
          />
        ) : null}
      </div>
    </>
  );
}
