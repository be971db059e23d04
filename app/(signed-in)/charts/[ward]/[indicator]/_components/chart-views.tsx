import { Segmented } from "@/app/_components/ui";
import { chartPageWords as words } from "@/lib/strings/charts";
import { addressOf } from "../../../_components/search-params";

interface ChartViewsProps {
  path: string;
  search: Record<string, string>;
  by: "month" | "quarter";
}

/** By month or by quarter, each with an address of its own. */
export function ChartViews({ path, search, by }: ChartViewsProps) {
  const item = (value: "month" | "quarter", label: string) => ({
    href: addressOf(path, search, { by: value === "month" ? undefined : value }),
    label,
    current: by === value,
  });
  return (
    <Segmented label={words.views} items={[item("month", words.byMonth), item("quarter", words.byQuarter)]} />
  );
}
