import type { Absorption } from "../kinetics/index.ts";

/** h until about nine tenths are absorbed: three half-lives of a rate leave 12 % in the gut (definition); an even input ends. */
export function absorbedAfter(absorption: Absorption): number {
  const halfLives = (ka: number) => (3 * Math.LN2) / ka;
  switch (absorption.kind) {
    case "first-order":
      return halfLives(absorption.ka);
    case "zero-order":
      return absorption.duration;
    case "mixed": {
      const slow = absorption.slow.kind === "first-order" ? halfLives(absorption.slow.ka) : absorption.slow.duration;
      return Math.max(halfLives(absorption.fastKa), absorption.slowLag + slow);
    }
  }
}
