const months = Array.from({ length: 12 }, (_, index) => index + 1);

/** The year as a month scale across the page, the month being returned in the accent. Decoration: pages say it. */
export function YearScale({ returnMonth }: { returnMonth: number | null }) {
  return (
    <svg className="year-scale" viewBox="0 0 120 4" preserveAspectRatio="none" aria-hidden="true">
      {months.map((month) => (
        <rect
          key={month}
          className={month === returnMonth ? "fill-over" : month % 2 === 1 ? "fill-ink" : "fill-paper"}
          x={(month - 1) * 10}
          y={0}
          width={10}
          height={4}
        />
      ))}
    </svg>
  );
}
