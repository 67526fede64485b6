import { createRequire } from "node:module";
import type { ModelDisposition, ModelHistory } from "../../../../src/core/kinetics/index.ts";

/** What is used of odex; its own TypeScript source does not pass strict checks, so it is loaded without it. */
interface OdexSolver {
  maxSteps: number;
  relativeTolerance: number;
  absoluteTolerance: number;
  initialStepSize: number;
  solve(
    derivative: (x: number, y: number[]) => number[],
    x: number,
    y: number[],
    xEnd: number,
  ): { y: number[]; outcome: number; nEval: number };
}

const { Solver } = createRequire(import.meta.url)("odex") as { Solver: new (dimension: number) => OdexSolver };

/**
 * Levels, amounts and area by an integrator that is none of ours: odex, a port of Hairer and Wanner's ODEX (Gragg–Bulirsch–Stoer
 * extrapolation). Restarted at every event. The equations are written here once more, from the definitions.
 */
export interface OdexState {
  level: number;
  gut: number;
  body: number;
  peripheral: number;
  eliminated: number;
  /** mg·h/L since the first event. */
  area: number;
}

interface Depot {
  ka: number;
  gives: { at: number; mg: number }[];
}

interface Feed {
  from: number;
  to: number;
  rate: number;
}

function inputsOf(history: ModelHistory): { depots: Depot[]; feeds: Feed[] } {
  const depots: Depot[] = [];
  const feeds: Feed[] = [];
  for (const { absorption, bioavailability, lag, doses } of history.inputs) {
    const add = (
      release: { kind: "first-order"; ka: number } | { kind: "zero-order"; duration: number },
      part: number,
      delay: number,
    ) => {
      if (release.kind === "first-order") {
        const gives = doses.map((dose) => ({ at: dose.time + delay, mg: bioavailability * part * dose.amount }));
        depots.push({ ka: release.ka, gives });
      } else {
        for (const dose of doses) {
          const from = dose.time + delay;
          const rate = (bioavailability * part * dose.amount) / release.duration;
          feeds.push({ from, to: from + release.duration, rate });
        }
      }
    };
    if (absorption.kind === "mixed") {
      add({ kind: "first-order", ka: absorption.fastKa }, absorption.fastFraction, lag);
      add(absorption.slow, 1 - absorption.fastFraction, lag + absorption.slowLag);
    } else add(absorption, 1, lag);
  }
  return { depots, feeds };
}

/** mg/h out of the central compartment for good, and over to the peripheral one. */
function flows(d: ModelDisposition, central: number, peripheral: number): [number, number] {
  if (d.kind === "saturable") return [(d.vmax * central) / (d.km * d.volume + central), 0];
  const out = (d.clearance / d.volume) * central;
  if (d.kind === "one-compartment") return [out, 0];
  return [out, (d.exchange / d.volume) * central - (d.exchange / d.peripheralVolume) * peripheral];
}

/** The state at each time (ascending), and how often the equations were evaluated. */
export function odexRun(
  history: ModelHistory,
  times: readonly number[],
  tolerance = 1e-13,
): { states: OdexState[]; evaluations: number } {
  const { depots, feeds } = inputsOf(history);
  const changes = history.dispositions.slice(1).map(({ from }) => from);
  const instants = [
    ...depots.flatMap(({ gives }) => gives.map(({ at }) => at)),
    ...feeds.flatMap(({ from, to }) => [from, to]),
    ...changes,
  ];
  const given = [
    ...depots.flatMap(({ gives }) => gives.map(({ mg }) => mg)),
    ...feeds.map((f) => f.rate * (f.to - f.from)),
  ];
  const scale = given.reduce((sum, mg) => Math.max(sum, mg), 0);
  const stops = [...new Set([...instants, ...times])].sort((a, b) => a - b);
  const n = depots.length;
  // Gut by depot, central, peripheral, eliminated, area.
  let y: number[] = new Array(n + 4).fill(0);
  let now = stops[0]!;
  let evaluations = 0;
  const states: OdexState[] = [];
  const at = (time: number) =>
    (history.dispositions.findLast(({ from }) => from <= time) ?? history.dispositions[0]!).disposition;
  let last = at(Number.NEGATIVE_INFINITY);
  let next = 0;
  for (const stop of stops) {
    if (stop > now) {
      const middle = now + (stop - now) / 2;
      last = at(middle);
      const disposition = last;
      const rate = feeds.reduce((sum, f) => (f.from <= middle && middle < f.to ? sum + f.rate : sum), 0);
      const solver = new Solver(n + 4);
      solver.maxSteps = 1_000_000;
      solver.relativeTolerance = tolerance;
      solver.absoluteTolerance = tolerance * scale;
      solver.initialStepSize = Math.min(1e-3, (stop - now) / 4);
      const found = solver.solve(
        (_x, v) => {
          let input = rate;
          const change: number[] = [];
          for (let i = 0; i < n; i++) {
            const absorbed = depots[i]!.ka * v[i]!;
            change.push(-absorbed);
            input += absorbed;
          }
          const [out, over] = flows(disposition, v[n]!, v[n + 1]!);
          change.push(input - out - over, over, out, v[n]! / disposition.volume);
          return change;
        },
        now,
        y,
        stop,
      );
      if (found.outcome !== 0) throw new Error(`odex stopped with outcome ${found.outcome}`);
      evaluations += found.nEval;
      y = found.y;
      now = stop;
    }
    for (; next < times.length && times[next] === stop; next++) {
      const feeding = feeds.reduce((sum, f) => sum + f.rate * (f.to - Math.min(f.to, Math.max(f.from, stop))), 0);
      const waiting = depots.reduce((sum, d) => sum + d.gives.reduce((s, g) => (g.at >= stop ? s + g.mg : s), 0), 0);
      const depot = y.slice(0, n).reduce((sum, mg) => sum + mg, 0);
      states.push({
        level: y[n]! / last.volume,
        // Of everything that is ever given: what is still to be taken counts here.
        gut: depot + feeding + waiting,
        body: y[n]!,
        peripheral: y[n + 1]!,
        eliminated: y[n + 2]!,
        area: y[n + 3]!,
      });
    }
    for (const [i, { gives }] of depots.entries()) {
      for (const { at: time, mg } of gives) if (time === stop) y[i] = y[i]! + mg;
    }
  }
  return { states, evaluations };
}
