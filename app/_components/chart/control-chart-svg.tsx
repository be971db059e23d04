import { pathOf, SceneShapeSvg } from "@/app/_components/chart/scene-shape";
import type { Scene } from "@/lib/scene/scene";

export interface ControlChartSvgProps {
  scene: Scene;
  /** Unique on the page: the picture's name hangs on it. */
  id: string;
}

/** A large scene as a picture with a name; its figures are in the table that the name points to. */
export function ControlChartSvg({ scene, id }: ControlChartSvgProps) {
  const nameId = `${id}-name`;
  return (
    <>
      <span id={nameId} hidden>
        {scene.label}
      </span>
      <svg
        className="chart-svg"
        viewBox={`0 0 ${scene.width} ${scene.height}`}
        width={scene.width}
        height={scene.height}
        role="img"
        aria-labelledby={nameId}
      >
        <Hatch scene={scene} id={id} />
        {scene.shapes.map((shape, index) => (
          <SceneShapeSvg key={index} shape={shape} size={scene.size} />
        ))}
      </svg>
    </>
  );
}

/** Where the system chooses the colours the band has none of its own: a hatch takes its place. */
function Hatch({ scene, id }: ControlChartSvgProps) {
  const bands = scene.shapes.flatMap((shape) =>
    shape.shape === "area" && (shape.role === "band" || shape.role === "band-provisional")
      ? shape.outlines
      : [],
  );
  if (bands.length === 0) return null;
  return (
    <g className="chart-hatch">
      <pattern id={`${id}-hatch`} width="7" height="7" patternUnits="userSpaceOnUse">
        <path className="stroke-edge" d="M0 7L7 0" strokeWidth={0.6} />
      </pattern>
      <path d={pathOf(bands, true)} fill={`url(#${id}-hatch)`} />
    </g>
  );
}
