import { Button, SectionHead, Select } from "@/app/_components/ui";
import { longMonth } from "@/lib/indicators/chart-format";
import type { Month } from "@/lib/indicators/month";
import { importPageWords as say } from "@/lib/strings/imports";

interface GetTemplateProps {
  wards: { code: string; name: string }[];
  months: Month[];
}

/** A plain form: the browser saves what the API sends. The month before is the one usually wanted. */
export function GetTemplate({ wards, months }: GetTemplateProps) {
  return (
    <section className="mb-6">
      <SectionHead>{say.templateTitle}</SectionHead>
      <p className="hint mb-2">{say.templateNote}</p>
      <form action="/api/imports/template.xlsx" method="get">
        <Select id="template-month" name="month" label={say.month} defaultValue={months[1]}>
          {months.map((month) => (
            <option key={month} value={month}>
              {longMonth(month)}
            </option>
          ))}
        </Select>
        {wards.length > 1 ? (
          <Select id="template-ward" name="ward" label={say.ward} defaultValue="">
            <option value="">{say.allWards}</option>
            {wards.map((ward) => (
              <option key={ward.code} value={ward.code}>
                {ward.name}
              </option>
            ))}
          </Select>
        ) : null}
        <Button type="submit">{say.getTemplate}</Button>
      </form>
    </section>
  );
}

export function TakeOut() {
  return (
    <section>
      <SectionHead>{say.exportTitle}</SectionHead>
      <p className="hint mb-2">{say.exportNote}</p>
      <ul>
        <li>
          <a href="/api/exports/tallies.xlsx">{say.exportWorkbook}</a>
        </li>
        <li>
          <a href="/api/exports/tallies.csv">{say.exportCsv}</a>
        </li>
      </ul>
    </section>
  );
}
