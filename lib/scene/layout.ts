import { formatCount } from "@/lib/scene/format";
import { textWidth } from "@/lib/scene/pens";
import { hasLimitsAt, type ChartData } from "@/lib/scene/chart-data";
import type { PlotBox, SceneSlot } from "@/lib/scene/scene";

/** Where things go on a large chart. Sizes are pixels at 100 %. */
export interface Layout extends PlotBox {
  width: number;
  slot: number;
  /** Value at the plot's top, as a fraction. */
  topValue: number;
  /** Height of the ceiling: 100 % of a proportion, else the plot's top. */
  ceiling: number;
  denominators: DenominatorRoom;
  x: (index: number) => number;
  slotFrom: (index: number) => number;
  slotTo: (index: number) => number;
  /** Values above the top are drawn at the top. */
  y: (value: number) => number;
}

/** How denominators are written, and the narrowest slot that holds them so. */
export interface DenominatorRoom {
  grouped: boolean;
  tight: boolean;
  least: number;
}

export interface LayoutOptions {
  /** Width of the picture as long as its months fit; more months make it wider, and the frame scrolls. */
  width?: number;
  plotHeight?: number;
}

const labelRoom = 118;
const plotTop = 34;
const leastSlot = 22;
const widestSlot = 72;

export function layOut(data: ChartData, options: LayoutOptions = {}): Layout {
  const width = options.width ?? 1016;
  const count = Math.max(1, data.points.length);
  const left = Math.min(124, Math.max(62, Math.ceil(textWidth(data.denominatorLabel, "row-head")) + 8));
  const wanted = (width - left - labelRoom) / count;
  const denominators = denominatorRoom(data, Math.max(wanted, leastSlot));
  const slot = Math.min(widestSlot, Math.max(wanted, leastSlot, denominators.least));
  const right = left + slot * count;
  const floor = plotTop + (options.plotHeight ?? 326);
  const topValue = valueAtTop(data);
  const y = (value: number) => {
    const share = Math.min(1, Math.max(0, value / topValue));
    return floor - share * (floor - plotTop);
  };
  return {
    width: right + labelRoom,
    left,
    right,
    top: plotTop,
    floor,
    slot,
    topValue,
    ceiling: data.kind === "proportion" ? y(Math.min(1, topValue)) : plotTop,
    denominators,
    x: (index) => left + slot * (index + 0.5),
    slotFrom: (index) => left + slot * index,
    slotTo: (index) => left + slot * (index + 1),
    y,
  };
}

export function slotsOf(layout: Layout, count: number): SceneSlot[] {
  const hundredth = (value: number) => Math.round(value * 100) / 100;
  return Array.from({ length: count }, (_, index) => ({
    from: hundredth(layout.slotFrom(index)),
    to: hundredth(layout.slotTo(index)),
    centre: hundredth(layout.x(index)),
  }));
}

/**
 * The axis starts at zero and holds every value, the target and the limits, except that a few months with tiny
 * denominators don't flatten the rest: limits beyond twice the usual upper limit leave the picture at its top.
 */
function valueAtTop(data: ChartData): number {
  const values = data.points.flatMap((point) => [point.value, soFarShare(point)]);
  const limits = present(data.points.map((point) => point.upperAction)).sort((a, b) => a - b);
  const usual = limits[Math.floor(limits.length / 2)] ?? 0;
  const highestLimit = Math.min(limits.at(-1) ?? 0, usual * 2);
  const highest = Math.max(0, highestLimit, data.target ?? 0, ...present(values), ...centresOf(data));
  if (highest === 0) return 5 / data.per;
  if (data.kind === "rate") return highest * 1.027;
  // A proportion without an upper limit has its band up to 100 %, and no proportion lies above.
  const unlimited = data.points.some(
    (point, index) => hasLimitsAt(data, index) && point.upperAction === null,
  );
  return unlimited ? 1 : Math.min(1, highest * 1.027);
}

function centresOf(data: ChartData): number[] {
  return present(data.segments.flatMap((segment) => [segment.centre, segment.earlierCentre ?? null]));
}

/** A count so far over the denominator, for the height of its ring. */
export function soFarShare(point: { countSoFar: number | null; denominator: number | null }): number | null {
  if (point.countSoFar === null || point.denominator === null || point.denominator === 0) return null;
  return point.countSoFar / point.denominator;
}

function present(values: (number | null)[]): number[] {
  return values.filter((value): value is number => value !== null);
}

/**
 * Denominators stand beneath each month. Where they would touch, four figures drop their comma, then take the
 * narrowest letters; only then are the months set wider apart.
 */
function denominatorRoom(data: ChartData, slot: number): DenominatorRoom {
  const widest = Math.max(0, ...present(data.points.map((point) => point.denominator)));
  const ways: Omit<DenominatorRoom, "least">[] = [
    { grouped: true, tight: false },
    ...(widest < 10_000 ? [{ grouped: false, tight: false }] : []),
    { grouped: widest >= 10_000, tight: true },
  ];
  const needs = ways.map((way): DenominatorRoom => {
    const text = way.grouped ? formatCount(widest) : String(widest);
    return { ...way, least: textWidth(text, way.tight ? "denominator-tight" : "denominator") + 2.5 };
  });
  return (
    needs.find((need) => need.least <= slot) ?? needs.at(-1) ?? { grouped: true, tight: false, least: 0 }
  );
}
