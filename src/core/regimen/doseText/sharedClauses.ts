import { fail, issue, type Result, succeed } from "../../result/index.ts";
import type { DoseSegment } from "./doseSegment.ts";

type Group = readonly (keyof DoseSegment)[];

const REPEAT: Group = ["once", "everyH", "isDaily", "timesPerDay", "weekdays"];
const LENGTH: Group = ["days", "doses", "endless"];
const DATE: Group = ["date"];
const PRODUCT: Group = ["product"];

/**
 * What is said of one amount holds for the others where they say nothing: "200 mg at 08:00 and 300 mg at 22:00 for 7 days" means 7 days for both.
 * A single dose takes no length or date from a repeat beside it. What could be meant two ways is refused.
 */
export function sharedClauses(segments: readonly DoseSegment[]): Result<readonly DoseSegment[]> {
  if (segments.length < 2) return succeed(segments);
  const named = share(segments, PRODUCT, () => true);
  if (!named.ok) return named;
  const repeated = share(named.value, REPEAT, () => true);
  if (!repeated.ok) return repeated;
  const isEveryOnce = repeated.value.every((segment) => segment.once);
  const takes = (segment: DoseSegment) => isEveryOnce || !segment.once;
  const ended = share(repeated.value, LENGTH, takes);
  if (!ended.ok) return ended;
  return share(ended.value, DATE, takes);
}

function share(
  segments: readonly DoseSegment[],
  group: Group,
  takes: (segment: DoseSegment) => boolean,
): Result<readonly DoseSegment[]> {
  const said = (segment: DoseSegment) => group.filter((key) => segment[key] !== undefined);
  const pick = (segment: DoseSegment) => Object.fromEntries(said(segment).map((key) => [key, segment[key]]));
  const saying = segments.filter((segment) => takes(segment) && said(segment).length > 0);
  const silent = segments.filter((segment) => takes(segment) && said(segment).length === 0);
  const [first] = saying;
  if (!first || silent.length === 0) return succeed(segments);
  const isOneThing = saying.every((segment) => JSON.stringify(pick(segment)) === JSON.stringify(pick(first)));
  // "10 doses" after two amounts may mean ten of each or ten in all.
  // Weekdays after one of two amounts may be meant for that one alone, the other being daily.
  const isOnWeekdays = group === REPEAT && saying.some(({ weekdays }) => weekdays !== undefined);
  if (!isOneThing || isOnWeekdays || (first.doses !== undefined && group === LENGTH)) {
    return fail(
      issue("dose-text-ambiguous", {
        part: silent.map((segment) => segment.amount?.part ?? "").join(", "),
        about: isOnWeekdays ? "weekdays" : group[0],
      }),
    );
  }
  const shared = pick(first);
  return succeed(segments.map((segment) => (silent.includes(segment) ? { ...segment, ...shared } : segment)));
}
