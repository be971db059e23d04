import { Link } from "@/app/_components/ui/link";
import { MonthScale, SectionHead } from "@/app/_components/ui";
import { flagMonth } from "@/lib/indicators/chart-format";
import type { Month } from "@/lib/indicators/month";
import type { ReturnListItem } from "@/lib/schemas/ward-return";
import { myPageWords as say } from "@/lib/strings/my-page";

type ScaleMonth = Parameters<typeof MonthScale>[0]["months"][number];

interface WardScalesProps {
  title: string;
  items: readonly ReturnListItem[];
  /** Oldest first. */
  months: readonly Month[];
  thisMonth: Month;
}

/** Each ward's twelve months at a glance: sent, missing, to be sent now. */
export function WardScales({ title, items, months, thisMonth }: WardScalesProps) {
  const wards = [...new Map(items.map((item) => [item.ward, item.wardName]))];
  if (wards.length === 0) return null;
  return (
    <section>
      <SectionHead
        note={say.scaleRange(flagMonth(months[0] ?? thisMonth), flagMonth(months.at(-1) ?? thisMonth))}
      >
        {title}
      </SectionHead>
      <ul className="ruled-list">
        {wards.map(([code, name]) => {
          const own = new Map(items.filter((item) => item.ward === code).map((item) => [item.month, item]));
          const sent = [...own.values()].filter((item) => item.status !== "open").length;
          return (
            <li key={code} className="ward-scale">
              <Link href={`/returns?ward=${encodeURIComponent(code)}`}>{name}</Link>
              <MonthScale
                months={months.map((month) => scaleMonth(own.get(month), month, thisMonth))}
                label={say.scaleName(name, sent, own.size)}
              />
            </li>
          );
        })}
      </ul>
    </section>
  );
}

function scaleMonth(item: ReturnListItem | undefined, month: Month, thisMonth: Month): ScaleMonth {
  if (item === undefined) return { state: "later" };
  if (item.status !== "open") return { state: "done", mark: item.late ? "late" : undefined };
  if (month === thisMonth) return { state: "later" };
  return item.late ? { state: "gap", mark: "missing" } : { state: "now", mark: "unsaved" };
}
