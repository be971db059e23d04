import {
  byarInterval,
  clopperPearsonInterval,
  garwoodInterval,
  midPInterval,
  wilsonInterval,
  type Interval,
} from "@/lib/limits";
import type { Fields, ReferenceCase } from "../case-format";
import { hasNumber, numberIn, rowsIn } from "../read-fields";

/** Topic l: intervals of proportions and of rates; rows carry their inputs. */
export function intervalFields({ input, expected }: ReferenceCase): Fields {
  const confidence = numberIn(input, "confidence", 0.95);
  const rows = rowsIn(expected).map((row) => rowFields(row, confidence));
  return rows.some((row) => Object.keys(row).length > 0) ? { rows } : {};
}

function rowFields(row: Fields, confidence: number): Fields {
  if (!hasNumber(row, "x")) return {};
  const x = numberIn(row, "x");
  if (hasNumber(row, "exposure")) {
    return rateFields(x, numberIn(row, "exposure"), numberIn(row, "per", 1), confidence);
  }
  const n = numberIn(row, "n");
  return {
    ...ends("wilson", wilsonInterval(x, n, confidence)),
    ...ends("clopper_pearson", clopperPearsonInterval(x, n, confidence)),
    ...ends("mid_p", midPInterval(x, n, confidence)),
  };
}

function ends(name: string, interval: Interval | null, factor = 1): Fields {
  return {
    [`${name}_low`]: interval === null ? null : interval.low * factor,
    [`${name}_high`]: interval === null ? null : interval.high * factor,
  };
}

function rateFields(x: number, exposure: number, per: number, confidence: number): Fields {
  const exact = garwoodInterval(x, exposure, confidence);
  const byar = byarInterval(x, exposure, confidence);
  return {
    rate: (per * x) / exposure,
    ...ends("exact_count", exact, exposure),
    ...ends("byar_count", byar, exposure),
    ...ends("exact_rate", exact, per),
    ...ends("byar_rate", byar, per),
  };
}
