import { Link } from "@/app/_components/ui/link";
import { Cell, DataRow, DataTable, HeadCell, Mark, RowHead } from "@/app/_components/ui";
import { longMonth } from "@/lib/indicators/chart-format";
import type { Month } from "@/lib/indicators/month";
import { shortDay } from "@/lib/indicators/return-dates";
import type { ReturnListItem } from "@/lib/schemas/ward-return";
import { returnListWords as say } from "@/lib/strings/returns";

/** One row a return; the month that is under way is quieter, since nothing is due of it. */
export function ReturnTable({ items, thisMonth }: { items: ReturnListItem[]; thisMonth: Month }) {
  return (
    <DataTable caption={say.caption} hideCaption look="roomy" className="blocks-on-phone">
      <thead>
        <tr>
          <HeadCell>{say.month}</HeadCell>
          <HeadCell>{say.ward}</HeadCell>
          <HeadCell>{say.state}</HeadCell>
          <HeadCell>{say.due}</HeadCell>
          <HeadCell numeric>{say.entered}</HeadCell>
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <ReturnRow key={`${item.ward} ${item.month}`} item={item} isUnderWay={item.month === thisMonth} />
        ))}
      </tbody>
    </DataTable>
  );
}

function ReturnRow({ item, isUnderWay }: { item: ReturnListItem; isUnderWay: boolean }) {
  return (
    <DataRow tone={isUnderWay ? "quiet" : undefined}>
      <RowHead>
        <Link href={`/returns/${item.ward}/${item.month}`}>{longMonth(item.month)}</Link>
      </RowHead>
      <Cell>{item.wardName}</Cell>
      <Cell>
        {say.states[item.status]}
        {item.reopened ? `, ${say.reopened}` : null}
        {isUnderWay && item.status === "open" ? `, ${say.underWay}` : null}
      </Cell>
      <Cell>
        {shortDay(item.dueOn)}
        {item.late ? (
          <>
            , <Mark mark="late" /> {say.late}
          </>
        ) : null}
      </Cell>
      <Cell numeric>{say.linesOf(item.answered, item.lines)}</Cell>
    </DataRow>
  );
}
