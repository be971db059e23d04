import { SceneShapeSvg } from "@/app/_components/chart/scene-shape";
import type { KeyEntry } from "@/lib/scene/key";
import type { LineRole, ScenePoint, SceneShape } from "@/lib/scene/scene";

interface Sample {
  width: number;
  shapes: SceneShape[];
}

const steps = {
  upper: [
    [0, 3],
    [12, 3],
    [12, 1],
    [34, 1],
  ],
  lower: [
    [0, 13],
    [12, 13],
    [12, 15],
    [34, 15],
  ],
} satisfies Record<string, ScenePoint[]>;

/** A short piece of a line or a point, drawn with the chart's own pens. */
export function LineSample({ entry }: { entry: KeyEntry }) {
  const sample = sampleOf(entry);
  if (sample === null) return null;
  return (
    <svg width={sample.width} height={16} viewBox={`0 0 ${sample.width} 16`} aria-hidden="true">
      {sample.shapes.map((shape, index) => (
        <SceneShapeSvg key={index} shape={shape} size="large" />
      ))}
    </svg>
  );
}

function sampleOf(entry: KeyEntry): Sample | null {
  switch (entry) {
    case "channel":
      return channel("band", "action-limit");
    case "provisional":
    case "trial":
      return channel("band-provisional", "action-limit-provisional");
    case "warning":
      return line("warning-limit", [
        [
          [0, 8],
          [13, 8],
        ],
        [
          [17, 8],
          [30, 8],
        ],
      ]);
    case "centre":
      return line("centre", [
        [
          [0, 8],
          [26, 8],
        ],
      ]);
    case "earlierCentre":
      return line("earlier-centre", [
        [
          [0, 8],
          [34, 8],
        ],
      ]);
    case "target":
      return line("target", [
        [
          [2, 8],
          [26, 8],
        ],
      ]);
    case "belowDetection":
      return {
        width: 14,
        shapes: [{ shape: "disc", role: "point-below-detection", at: [7, 8], radius: 3.3 }],
      };
    case "openReturn":
      return { width: 14, shapes: [{ shape: "disc", role: "point-open", at: [7, 8], radius: 3.6 }] };
    default:
      return null;
  }
}

function channel(band: "band" | "band-provisional", edge: LineRole): Sample {
  return {
    width: 34,
    shapes: [
      { shape: "area", role: band, outlines: [[...steps.upper, ...steps.lower.toReversed()]] },
      { shape: "line", role: edge, lines: [steps.upper, steps.lower] },
    ],
  };
}

function line(role: LineRole, lines: ScenePoint[][]): Sample {
  const width = Math.max(...lines.flat().map(([x]) => x));
  return { width, shapes: [{ shape: "line", role, lines }] };
}
