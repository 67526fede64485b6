import {
  argumentAboveZero,
  argumentFinite,
  argumentFraction,
  argumentNotNegative,
  argumentRefuse,
} from "./argumentCheck.ts";
import type { Dose, OralKinetics } from "./oralKinetics.ts";

/** What the body does with the medicine, whichever product it came from. */
export interface Disposition {
  /** Elimination rate constant, 1/h, above 0. */
  ke: number;
  /** Volume of distribution, L, above 0. */
  volume: number;
}

/** The doses of one product, with how that product is absorbed. */
export interface Course {
  /** Absorption rate constant, 1/h, above 0. */
  ka: number;
  /** 0–1 */
  bioavailability: number;
  /** h, 0 or more. */
  lag: number;
  /** In ascending order of time; doses at one time add. */
  doses: readonly Dose[];
}

export function dispositionCheck(disposition: Disposition): void {
  argumentAboveZero("disposition.ke", disposition.ke, "/h");
  argumentAboveZero("disposition.volume", disposition.volume, "L");
}

export function coursesCheck(courses: readonly Course[]): void {
  let total = 0;
  for (const [index, course] of courses.entries()) {
    const name = `courses[${index}]`;
    argumentAboveZero(`${name}.ka`, course.ka, "/h");
    argumentFraction(`${name}.bioavailability`, course.bioavailability);
    argumentNotNegative(`${name}.lag`, course.lag, "h");
    let before = -Infinity;
    for (let i = 0; i < course.doses.length; i++) {
      const { time, amount } = course.doses[i]!;
      if (!(time >= before && time < Infinity)) {
        argumentFinite(`${name}.doses[${i}].time`, time, "h");
        argumentRefuse(`${name}.doses[${i}].time`, time, "h", `not before that of the dose before it, ${before} h`);
      }
      if (!(amount >= 0 && amount < Infinity)) argumentNotNegative(`${name}.doses[${i}].amount`, amount, "mg");
      if (time === -Infinity) argumentFinite(`${name}.doses[${i}].time`, time, "h");
      before = time;
      total += amount;
    }
  }
  if (total === Infinity) argumentRefuse("the sum of all doses", total, "mg", "a finite number");
}

/** One product, one body: the general layer's view of the section-7 arguments. */
export function courseOf(kinetics: OralKinetics, doses: readonly Dose[]): [Disposition, Course[]] {
  const { ka, ke, volume, bioavailability, lag } = kinetics;
  return [{ ke, volume }, [{ ka, bioavailability, lag, doses }]];
}
