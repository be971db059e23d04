import type { ReactNode } from "react";

const segments = 12;

/**
 * The month scale filling segment by segment; the words say what is being fetched. Both stay unseen for 300 ms, so
 * that quick answers don't flicker.
 */
export function Loading({ children }: { children: ReactNode }) {
  return (
    <div className="empty-state" role="status">
      <div className="loading">
        <svg className="month-scale" viewBox="0 0 313 8" width="313" height="8" aria-hidden="true">
          {Array.from({ length: segments }, (_, index) => (
            <rect
              key={index}
              className={`stroke-ink ${index % 2 === 0 ? "fill-ink" : "fill-sheet"}`}
              x={index * 26 + 0.5}
              y={1}
              width={26}
              height={6}
            />
          ))}
        </svg>
        <p>{children}</p>
      </div>
    </div>
  );
}
