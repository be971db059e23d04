import { SceneShapeSvg } from "@/app/_components/chart/scene-shape";
import type { Scene } from "@/lib/scene/scene";

/** A small scene. Hidden from assistive technology: the value and its mark stand beside it in words. */
export function SmallChart({ scene }: { scene: Scene }) {
  return (
    <svg
      className="small-chart"
      viewBox={`0 0 ${scene.width} ${scene.height}`}
      width={scene.width}
      height={scene.height}
      aria-hidden="true"
    >
      {scene.shapes.map((shape, index) => (
        <SceneShapeSvg key={index} shape={shape} size={scene.size} />
      ))}
    </svg>
  );
}
