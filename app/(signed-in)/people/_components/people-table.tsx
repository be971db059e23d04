import { Button, DataRow, DataTable, HeadCell } from "@/app/_components/ui";
import type { PersonRecord } from "@/lib/schemas/person";
import { peopleWords, roleWords } from "@/lib/strings/people";
import type { WardChoice } from "./people-desk";

interface PeopleTableProps {
  people: PersonRecord[];
  wards: WardChoice[];
  openId: string | undefined;
  onEdit: (id: string) => void;
}

export function PeopleTable({ people, wards, openId, onEdit }: PeopleTableProps) {
  return (
    <div className="table-scroll">
      <DataTable caption={peopleWords.caption} hideCaption look="roomy">
        <thead>
          <tr>
            <HeadCell>{peopleWords.name}</HeadCell>
            <HeadCell>{peopleWords.role}</HeadCell>
            <HeadCell className="not-on-phone">{peopleWords.where}</HeadCell>
            <HeadCell className="not-on-phone">{peopleWords.lastSignIn}</HeadCell>
            <HeadCell>
              <span className="sr-only">{peopleWords.edit}</span>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          {people.map((person) => (
            <DataRow key={person.id} tone={rowTone(person, openId)}>
              <th scope="row">
                <b>{person.name}</b>
                <small>{person.email}</small>
              </th>
              <td>{roleWords[person.role].name}</td>
              <td className="not-on-phone">{whereOf(person, wards)}</td>
              <td className="not-on-phone">{lastSeen(person)}</td>
              <td>
                <Button
                  look="text"
                  aria-label={peopleWords.editWho(person.name)}
                  onClick={() => onEdit(person.id)}
                >
                  {peopleWords.edit}
                </Button>
              </td>
            </DataRow>
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

function rowTone(person: PersonRecord, openId: string | undefined) {
  if (person.id === openId) return "selected";
  return person.state === "off" ? "quiet" : undefined;
}

function whereOf(person: PersonRecord, wards: WardChoice[]): string {
  const names = person.wards.map((code) => wards.find((ward) => ward.code === code)?.name ?? code);
  return names.length === 0 ? roleWords[person.role].where : names.join(", ");
}

function lastSeen(person: PersonRecord) {
  if (person.state === "off") return <i>{peopleWords.off}</i>;
  if (person.state === "invited") return <i>{peopleWords.invited}</i>;
  if (person.lastSignedInAt === null) return peopleWords.never;
  return <time dateTime={person.lastSignedInAt}>{peopleWords.day(person.lastSignedInAt)}</time>;
}
