import { instantMs, instantText, WEEKDAYS } from "../time/index.ts";
import { numberPlain } from "../units/index.ts";
import type { DoseAmount, DoseException, DoseLine } from "./doseLine.ts";
import type { DoseProduct } from "./doseProduct.ts";

export interface DoseLineTextContext {
  readonly zone: string;
  readonly products: readonly Pick<DoseProduct, "id" | "name">[];
  /** Id of the product that need not be named. */
  readonly defaultProduct: string;
}

/** A line in the words `doseTextRead` takes, complete with day and year: reading it gives the same line. */
export function doseLineText(line: DoseLine, context: DoseLineTextContext): string {
  const product = context.products.find((each) => each.id === line.product);
  const of = line.product === context.defaultProduct ? "" : ` of ${product?.name ?? line.product}`;
  const instant = (iso: string) => typedInstant(iso, context.zone);
  const parts = [`${amountText(line.amount)}${of} ${repeatText(line, instant(line.start))}`];
  for (const exception of line.except ?? []) parts.push(exceptionText(exception, instant));
  return parts.join(", ");
}

function repeatText({ repeat }: DoseLine, start: string): string {
  if (!repeat) return `once at ${start}`;
  if ("every" in repeat) {
    const count = repeat.count === undefined ? "" : `, ${repeat.count} ${repeat.count === 1 ? "dose" : "doses"}`;
    return `every ${numberPlain(repeat.every.value)} h from ${start}${count}`;
  }
  const list = listText([...repeat.clock].sort());
  const days = repeat.days === undefined ? "" : ` for ${repeat.days} ${repeat.days === 1 ? "day" : "days"}`;
  return `${repeat.weekdays ? `at ${list} ${weekdaysText(repeat.weekdays)}` : `daily at ${list}`} from ${start}${days}`;
}

/** One weekday as "every Mon": "on Mon" could be a single one. */
function weekdaysText(weekdays: readonly number[]): string {
  const names = weekdays.map((day) => (WEEKDAYS[day - 1] ?? "").slice(0, 3));
  return `${names.length === 1 ? "every" : "on"} ${listText(names)}`;
}

function listText(items: readonly string[]): string {
  const last = items.at(-1) ?? "";
  return items.length < 2 ? last : `${items.slice(0, -1).join(", ")} and ${last}`;
}

function exceptionText({ index, status, at, amount }: DoseException, instant: (iso: string) => string): string {
  const to = status === "moved" ? "to" : "at";
  const when = status === "missed" || at === undefined ? "" : ` ${to} ${instant(at)}`;
  const howMuch = status === "missed" || amount === undefined ? "" : ` ${amountText(amount)}`;
  return `dose ${index + 1} ${status}${when}${howMuch}`;
}

const amountText = ({ value, unit }: DoseAmount): string =>
  `${numberPlain(value)} ${unit === "ug" ? "microgram" : unit}`;

/** To the minute in words; an instant with seconds as ISO, so that nothing is lost. */
function typedInstant(iso: string, zone: string): string {
  return instantMs(iso) % 60_000 === 0 ? instantText(instantMs(iso), zone, "typed") : iso;
}
