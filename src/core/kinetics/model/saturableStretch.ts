import { signChanges } from "../../numerics/index.ts";
import { argumentRefuse } from "../argumentCheck.ts";
import { linearResponseArea, linearResponseAt } from "./linearResponse.ts";
import {
  type SaturableSeries,
  type Saturation,
  saturableSeries,
  seriesArea,
  seriesAt,
  seriesSquared,
  seriesUsedArea,
} from "./saturableSeries.ts";
import { type Inflow, inflowAt, inflowSlopeAt, type Stretch, stretchReach } from "./stretch.ts";

/** Below this part of Km × volume the elimination is in proportion to the amount, to the last digit. */
const LINEAR_BELOW = 1e-17;
/** A slope smaller than this part of what it is the difference of has no sign that could be trusted. */
const NOISE = 1e-14;
/** A stretch that needs more pieces than this has a time constant far below any medicine's. */
const MOST_PIECES = 5_000;

/** A piece of the stretch; areas are up to its start. Without a series it is the linear tail, which has no end. */
interface Piece {
  readonly start: number;
  readonly end: number;
  readonly body: number;
  readonly inflow: Inflow;
  readonly series: SaturableSeries | undefined;
  /** mg·h in the body and mg eliminated before it. */
  readonly area: number;
  readonly eliminated: number;
}

/** The stretch of a body whose elimination saturates, in power series strung together as far as they are asked for. */
export class SaturableStretch implements Stretch {
  readonly #saturation: Saturation;
  readonly #volume: number;
  readonly #inflow: Inflow;
  readonly #length: number;
  readonly #pieces: Piece[] = [];
  #last = 0;

  constructor(saturation: Saturation, volume: number, body: number, inflow: Inflow, length: number) {
    this.#length = length;
    this.#saturation = saturation;
    this.#volume = volume;
    this.#inflow = inflow;
    this.#pieces.push(this.#piece(0, body, 0, 0));
  }

  levelAt(u: number): number {
    return this.#bodyAt(u) / this.#volume;
  }

  slopeAt(u: number): number {
    return this.#bodySlopeAt(u) / this.#volume;
  }

  /**
   * (D + f′(b))·b′ = inflow′ with f the elimination: as f′ > 0 and the inflow only falls, b′ changes sign at most once, from rising to
   * falling. On a plateau the sign drowns in rounding, so the first piece is sought at whose end the level falls for certain: pieces
   * are shorter than anything that happens.
   */
  turns(length: number): readonly number[] {
    if (!(this.#bodySlopeAt(0) > 0)) return [];
    this.#at(length);
    const tail = this.#pieces.find(({ series }) => series === undefined);
    const far = tail === undefined ? length : stretchReach(length, Math.min(this.#linearRate, ...this.#inflow.ka));
    const ends = this.#pieces.map(({ start }) => start).filter((start) => start > 0 && start < far);
    let rising = 0;
    for (const end of [...ends, far]) {
      const slope = this.#bodySlopeAt(end);
      if (slope < -NOISE * this.#eliminationAt(end)) {
        const bracket = [rising, end];
        return signChanges(
          (u) => this.#bodySlopeAt(u),
          (u) => this.#bodyBendAt(u),
          bracket,
        ).slice(0, 1);
      }
      if (slope > 0) rising = end;
    }
    return [];
  }

  areaTo(u: number): number {
    const { start, area, body, inflow, series } = this.#at(u);
    const more =
      series === undefined
        ? linearResponseArea(this.#linearRate, body, inflow, u - start)
        : series.unit * seriesArea(series.body, (u - start) / series.unit);
    return (area + more) / this.#volume;
  }

  bodyAt(u: number): Float64Array {
    return Float64Array.of(this.#bodyAt(u));
  }

  eliminatedTo(u: number): number {
    const { start, eliminated, body, inflow, series } = this.#at(u);
    if (series === undefined) {
      return eliminated + this.#linearRate * linearResponseArea(this.#linearRate, body, inflow, u - start);
    }
    return eliminated + this.#saturation.vmax * series.unit * seriesUsedArea(series, (u - start) / series.unit);
  }

  /**
   * h over which the capacity stands free: ∫ (1 − elimination/vmax) over the first u h; and ∫ of the square of that, which says how
   * much of a difference in the amount at the start is left at the end.
   */
  freeTo(u: number): { free: number; squared: number } {
    let free = 0;
    let squared = 0;
    const at = this.#at(u);
    for (const piece of this.#pieces) {
      const length = piece === at ? u - piece.start : piece.end - piece.start;
      const { series } = piece;
      if (series === undefined) {
        free += length;
        squared += length;
      } else {
        const { unit } = series;
        free += unit * seriesArea(series.free, length / unit);
        squared += unit * seriesArea(seriesSquared(series.free), length / unit);
      }
      if (piece === at) break;
    }
    return { free, squared };
  }

  get #linearRate(): number {
    return this.#saturation.vmax / this.#saturation.half;
  }

  #bodyAt(u: number): number {
    const { start, body, inflow, series } = this.#at(u);
    if (series === undefined) return linearResponseAt(this.#linearRate, body, inflow, u - start);
    // A rounding below 0 can only be seen where all but nothing is there.
    return Math.max(0, seriesAt(series.body, (u - start) / series.unit));
  }

  #eliminationAt(u: number): number {
    const { vmax, half } = this.#saturation;
    const body = this.#bodyAt(u);
    return vmax * (body / (half + body));
  }

  #bodySlopeAt(u: number): number {
    return inflowAt(this.#inflow, u) - this.#eliminationAt(u);
  }

  #bodyBendAt(u: number): number {
    const { vmax, half } = this.#saturation;
    const total = half + this.#bodyAt(u);
    return inflowSlopeAt(this.#inflow, u) - vmax * (half / total / total) * this.#bodySlopeAt(u);
  }

  #piece(start: number, body: number, area: number, eliminated: number): Piece {
    const { ka, gut, rate } = this.#inflow;
    const left = gut.map((amount, i) => amount * Math.exp(-ka[i]! * start));
    const inflow = { ka, gut: left, rate };
    const atStake = left.reduce((sum, amount) => sum + amount, body);
    if (rate === 0 && atStake <= LINEAR_BELOW * this.#saturation.half) {
      return { start, end: Infinity, body, inflow, series: undefined, area, eliminated };
    }
    const series = saturableSeries(this.#saturation, body, inflow, Math.max(0, this.#length - start));
    return { start, end: start + series.length, body, inflow, series, area, eliminated };
  }

  /** The piece that holds u, made if it isn't there yet. */
  #at(u: number): Piece {
    const pieces = this.#pieces;
    let piece = pieces[pieces.length - 1]!;
    while (u > piece.end) {
      if (pieces.length >= MOST_PIECES || !(piece.end > piece.start)) {
        argumentRefuse("vmax / (km × volume)", this.#linearRate, "/h", `a rate that ${u} h can be followed at`);
      }
      const series = piece.series!;
      const x = series.length / series.unit;
      const { unit } = series;
      const { vmax } = this.#saturation;
      piece = this.#piece(
        piece.end,
        Math.max(0, seriesAt(series.body, x)),
        piece.area + unit * seriesArea(series.body, x),
        piece.eliminated + vmax * unit * seriesUsedArea(series, x),
      );
      pieces.push(piece);
    }
    // Mostly the same piece as last time, or the next.
    let i = this.#last;
    while (pieces[i]!.start > u && i > 0) i--;
    while (u > pieces[i]!.end) i++;
    this.#last = i;
    return pieces[i]!;
  }
}
