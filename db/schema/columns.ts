import { customType, text, timestamp, uuid } from "drizzle-orm/pg-core";
import type { Month } from "@/lib/indicators/month";

/** A calendar month as `YYYY-MM`; each table adds a CHECK by `monthCheck`. */
export const monthColumn = (name: string) => text(name).$type<Month>();

/** UUIDv7 made by the application. */
export const idColumn = () => uuid("id").primaryKey();

/** An instant, with time zone, read as a Date. */
export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: "date", precision: 3 });

/** A calendar date without a time, as `YYYY-MM-DD` text on both drivers. */
export const calendarDate = customType<{ data: string; driverData: string | Date }>({
  dataType: () => "text",
  fromDriver: (value) => String(value),
});
