import { Button, Select } from "@/app/_components/ui";
import { longMonth } from "@/lib/indicators/chart-format";
import type { Month } from "@/lib/indicators/month";
import { returnListWords as say } from "@/lib/strings/returns";

interface ReturnFilterProps {
  wards: { code: string; name: string }[];
  months: Month[];
  ward: string | undefined;
  month: string | undefined;
}

/** A plain form: it works before any script has arrived. */
export function ReturnFilter({ wards, months, ward, month }: ReturnFilterProps) {
  return (
    <form className="return-filter" method="get">
      {wards.length > 1 ? (
        <Select id="filter-ward" name="ward" label={say.ward} defaultValue={ward ?? ""} inline>
          <option value="">{say.allWards}</option>
          {wards.map((each) => (
            <option key={each.code} value={each.code}>
              {each.name}
            </option>
          ))}
        </Select>
      ) : null}
      <Select id="filter-month" name="month" label={say.month} defaultValue={month ?? ""} inline>
        <option value="">{say.allMonths}</option>
        {months.map((each) => (
          <option key={each} value={each}>
            {longMonth(each)}
          </option>
        ))}
      </Select>
      <Button type="submit">{say.filter}</Button>
    </form>
  );
}
