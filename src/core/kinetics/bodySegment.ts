import { rootBracketed } from "../numerics/index.ts";
import type { BodyState } from "./bodyState.ts";

/**
 * A segment is the stretch between two instants with no dose. Within it the body amount b obeys b′ = r(u) − ke·b with an
 * input r that only falls, so e^(ke·u)·b′ has the derivative e^(ke·u)·r′ <= 0: b′ changes sign at most once, from rising to
 * falling. However many products feed it, a segment therefore has at most one stationary point (a maximum), its lowest level
 * stands at an end, and a level is crossed at most once on either side of the maximum.
 */

/** dB/du, mg/h. */
function slopeAt(state: BodyState, u: number): number {
  return state.inputAt(u) - state.ke * state.bodyAt(u);
}

/**
 * Where the level is highest within the next `length` h, if that is not at an end.
 *
 * Formula, one product: u = −ln(1 − d·z)/d, d = ka − ke, z = (1 − q)/ka, q = ke·B/(ka·G); z when d = 0.
 * Several products: the zero of the slope, bracketed by the ends, by safeguarded Newton steps.
 * @returns h from the start of the segment, or undefined
 * Accuracy: relative 1e-15 for one product; 4.4e-16·length for several, as far as rounding leaves the slope a sign.
 */
export function bodySegmentPeak(state: BodyState, length: number): number | undefined {
  if (!(slopeAt(state, 0) > 0)) return undefined;
  if (state.ka.length === 1) {
    const u = peakOfOneProduct(state.ka[0]!, state.ke, state.gut[0]!, state.body);
    return u > 0 && u < length ? u : undefined;
  }
  const slope = (u: number) => slopeAt(state, u);
  let far = length;
  // Far out everything may underflow to 0: come back to where the slope has a sign.
  while (slope(far) === 0 && far > 0) far /= 2;
  if (slope(far) > 0) return far < length ? far : undefined;
  const bend = (u: number) => -state.inputFallAt(u) - state.ke * slopeAt(state, u);
  const found = rootBracketed(slope, bend, 0, far, far / 2, 0);
  if (!found.converged) throw new Error("bodySegmentPeak: the root search did not converge");
  return found.root > 0 && found.root < length ? found.root : undefined;
}

function peakOfOneProduct(ka: number, ke: number, gut: number, body: number): number {
  const d = ka - ke;
  const q = (ke / ka) * (body / gut);
  const z = (1 - q) / ka;
  const y = d * z;
  if (Math.abs(y) < Number.EPSILON / 4) return z;
  if (y < 0.5) return -Math.log1p(-y) / d;
  return -Math.log((ke / ka) * (1 - q) + q) / d;
}

/**
 * For how long the level is above (or below) a given amount within a stretch where it only rises or only falls.
 *
 * @param amount mg
 * @param side "above" or "below": strictly, so a stretch that rests on the amount counts for neither
 * @returns h, 0 to `to` − `from`
 */
function hoursBeyond(state: BodyState, from: number, to: number, amount: number, side: "above" | "below"): number {
  const sign = side === "above" ? 1 : -1;
  const isFromBeyond = sign * (state.bodyAt(from) - amount) > 0;
  const isToBeyond = sign * (state.bodyAt(to) - amount) > 0;
  if (isFromBeyond === isToBeyond) return isFromBeyond ? to - from : 0;
  const isRising = isToBeyond === (side === "above");
  // Rising it is concave: plain Newton from the left. Falling it is nearly an exponential: Newton on its logarithm.
  const found = isRising
    ? rootBracketed(
        (u) => state.bodyAt(u) - amount,
        (u) => slopeAt(state, u),
        from,
        to,
        from,
        0,
      )
    : rootBracketed(
        (u) => Math.log(state.bodyAt(u) / amount),
        (u) => slopeAt(state, u) / state.bodyAt(u),
        from,
        to,
        to,
        0,
      );
  if (!found.converged) throw new Error("bodySegment: the root search did not converge");
  return isToBeyond ? to - found.root : found.root - from;
}

/** For how long within the next `length` h the level is strictly above (or below) an amount in mg; `peak` as found above. */
export function bodySegmentHours(
  state: BodyState,
  length: number,
  peak: number | undefined,
  amount: number,
  side: "above" | "below",
): number {
  if (peak === undefined) return hoursBeyond(state, 0, length, amount, side);
  return hoursBeyond(state, 0, peak, amount, side) + hoursBeyond(state, peak, length, amount, side);
}
