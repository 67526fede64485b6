import type { Course, Disposition } from "../course.ts";
import { type ModelEvent, type ModelPart, modelEventsOf, modelPartsOf } from "./modelEvents.ts";
import { type DispositionSpan, type ModelDisposition, type ModelHistory, modelHistoryCheck } from "./modelHistory.ts";
import type { ModelKind } from "./modelKind.ts";
import { ModelRun } from "./modelRun.ts";

/** A history made ready: checked, products split into their parts, everything that happens in order. */
export interface ModelPlan {
  readonly kind: ModelKind<ModelDisposition>;
  readonly parts: readonly ModelPart[];
  readonly spans: readonly DispositionSpan[];
  /** Made when first asked for: the plain courses do without. */
  readonly events: readonly ModelEvent[];
}

function isSame(a: ModelDisposition, b: ModelDisposition): boolean {
  const figures = Object.entries(a);
  return figures.every(([name, value]) => (b as unknown as Record<string, unknown>)[name] === value);
}

/** Throws a RangeError for a history out of range. A change to an equal disposition is no event. */
export function modelPlanOf(history: ModelHistory): ModelPlan {
  const kind = modelHistoryCheck(history);
  const spans = history.dispositions.filter(
    ({ disposition }, i) => i === 0 || !isSame(disposition, history.dispositions[i - 1]!.disposition),
  );
  const parts = modelPartsOf(history.inputs);
  let events: readonly ModelEvent[] | undefined;
  return {
    kind,
    parts,
    spans,
    get events() {
      events ??= modelEventsOf(parts, spans);
      return events;
    },
  };
}

/** A run of the plan that has come to the instant `start`, h, through whatever happened before it. */
export function modelPlanRun({ kind, parts, spans, events }: ModelPlan, start: number, isBalanced = false): ModelRun {
  const dispositions = spans.map(({ disposition }) => disposition);
  const run = new ModelRun(kind, parts, dispositions, events, isBalanced);
  const first = events[0];
  if (first !== undefined && first.at - start + first.rest < 0) run.go(first, { at: start, rest: 0 });
  return run;
}

/**
 * The plan as the courses of one first-order, one-compartment body, where it is no more than that: the older and more exact
 * functions then do the work.
 */
export function modelPlanCourses({
  spans,
  parts,
}: Pick<ModelPlan, "spans" | "parts">): { disposition: Disposition; courses: Course[] } | undefined {
  const disposition = spans.length === 1 ? spans[0]!.disposition : undefined;
  if (disposition?.kind !== "one-compartment") return undefined;
  const courses: Course[] = [];
  for (const { release, share, lag, doses } of parts) {
    if (release.kind !== "first-order") return undefined;
    courses.push({ ka: release.ka, bioavailability: share, lag, doses });
  }
  return { disposition: { ke: disposition.clearance / disposition.volume, volume: disposition.volume }, courses };
}
