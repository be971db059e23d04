import { Link } from "@/app/_components/ui/link";
import { Button, TextInput } from "@/app/_components/ui";
import { chartPageWords as words } from "@/lib/strings/charts";
import { addressOf } from "../../../_components/search-params";

interface ViewFormProps {
  path: string;
  search: Record<string, string>;
}

/** "As known on" and the months shown: plain forms, whose answers stand in the address. */
export function ViewForm({ path, search }: ViewFormProps) {
  return (
    <>
      <form className="view-form" method="get" action={path}>
        <Kept search={search} except={["asOf"]} />
        <TextInput
          id="asOf"
          name="asOf"
          type="date"
          label={words.asKnownOn}
          defaultValue={search.asOf?.slice(0, 10)}
          required
        />
        <Button type="submit">{words.show}</Button>
      </form>
      <form className="view-form" method="get" action={path}>
        <Kept search={search} except={["from", "to"]} />
        <TextInput id="from" name="from" type="month" label={words.rangeFrom} defaultValue={search.from} />
        <TextInput id="to" name="to" type="month" label={words.rangeTo} defaultValue={search.to} />
        <Button type="submit">{words.show}</Button>
        {search.from || search.to ? (
          <Link href={addressOf(path, search, { from: undefined, to: undefined })}>{words.allMonths}</Link>
        ) : null}
      </form>
    </>
  );
}

/** What the rest of the address says goes along. */
function Kept({ search, except }: { search: Record<string, string>; except: string[] }) {
  return Object.entries(search)
    .filter(([name]) => !except.includes(name))
    .map(([name, value]) => <input key={name} type="hidden" name={name} value={value} />);
}
