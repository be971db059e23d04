import { fillClass, strokeClass } from "@/app/_components/chart/pens";
import { classNames } from "@/app/_components/ui/class-names";
import { isOverprint, markHref } from "@/app/_components/ui/mark";
import { areaPens, discPens, linePens, smallLinePens, textPens, type AreaPen } from "@/lib/scene/pens";
import type {
  AreaShape,
  DiscShape,
  GlyphShape,
  LabelShape,
  LineShape,
  Scene,
  ScenePoint,
  SceneShape,
} from "@/lib/scene/scene";

/** One shape of a scene as SVG: colours by class, everything else by presentation attributes. */
export function SceneShapeSvg({ shape, size }: { shape: SceneShape; size: Scene["size"] }) {
  switch (shape.shape) {
    case "line":
      return <LineSvg shape={shape} size={size} />;
    case "area":
      return <AreaSvg shape={shape} />;
    case "disc":
      return <DiscSvg shape={shape} />;
    case "label":
      return <LabelSvg shape={shape} />;
    case "glyph":
      return <GlyphSvg shape={shape} />;
  }
}

export function pathOf(lines: ScenePoint[][], closed = false): string {
  return lines.map((line) => `M${line.map(([x, y]) => `${x} ${y}`).join("L")}${closed ? "Z" : ""}`).join("");
}

function LineSvg({ shape, size }: { shape: LineShape; size: Scene["size"] }) {
  const pen = (size === "small" ? smallLinePens[shape.role] : undefined) ?? linePens[shape.role];
  return (
    <path
      className={classNames(strokeClass[pen.stroke], "fill-none")}
      d={pathOf(shape.lines)}
      strokeWidth={pen.width}
      strokeDasharray={pen.dash?.join(" ")}
      strokeLinecap={pen.round ? "round" : undefined}
      strokeLinejoin={shape.role === "record" ? "round" : undefined}
    />
  );
}

function paint(pen: AreaPen) {
  return {
    className: classNames(fillClass[pen.fill], pen.stroke && strokeClass[pen.stroke]),
    fillOpacity: pen.fillOpacity,
    strokeWidth: pen.width,
    strokeDasharray: pen.dash?.join(" "),
  };
}

function AreaSvg({ shape }: { shape: AreaShape }) {
  const { className, ...rest } = paint(areaPens[shape.role]);
  const isBand = shape.role === "band" || shape.role === "band-provisional";
  return (
    <path
      d={pathOf(shape.outlines, true)}
      className={classNames(className, isBand && "chart-band")}
      {...rest}
    />
  );
}

function DiscSvg({ shape }: { shape: DiscShape }) {
  const [cx, cy] = shape.at;
  return <circle cx={cx} cy={cy} r={shape.radius} {...paint(discPens[shape.role])} />;
}

function LabelSvg({ shape }: { shape: LabelShape }) {
  const pen = textPens[shape.role];
  const [x, y] = shape.at;
  const turned =
    shape.turn === undefined ? { x, y } : { transform: `translate(${x} ${y}) rotate(${shape.turn})` };
  return (
    <text
      {...turned}
      className={classNames(
        fillClass[pen.fill],
        pen.halo && strokeClass[pen.halo],
        pen.halo && "chart-text-halo",
      )}
      textAnchor={shape.anchor === "start" ? undefined : shape.anchor}
      fontSize={pen.size}
      fontStretch={pen.stretch === 100 ? undefined : `${pen.stretch}%`}
      fontStyle={pen.italic ? "italic" : undefined}
      fontWeight={pen.weight === 400 ? undefined : pen.weight}
    >
      {shape.text}
    </text>
  );
}

function GlyphSvg({ shape }: { shape: GlyphShape }) {
  const [x, y] = shape.at;
  return (
    <use
      className={isOverprint(shape.glyph) ? "text-over" : "text-ink"}
      href={markHref(shape.glyph)}
      x={x}
      y={y}
      width={shape.size}
      height={shape.size}
    />
  );
}
