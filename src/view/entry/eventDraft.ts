import type { Case, Factor } from "../../core/case/index.ts";
import type { Interaction, MedicineRecord } from "../../core/medicine/index.ts";
import { eventWords, medicinesWords } from "../../core/messages/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import { instantMs, instantRead, instantText } from "../../core/time/index.ts";
import { quantityConvert } from "../../core/units/index.ts";
import { instantTyped } from "../ui/InstantInput.tsx";
import { isDraftEmpty, type QuantityDraft, quantityDraft, quantityDraftRead } from "../ui/quantityDraft.ts";
import { firstDoseMs } from "./levelDraft.ts";

/** An event being typed. */
export interface EventDraft {
  readonly kind: Factor["kind"] | null;
  readonly name: string;
  readonly from: string;
  readonly to: string;
  readonly clearance: QuantityDraft<"%">;
  readonly volume: QuantityDraft<"%">;
  readonly onset: QuantityDraft<"d">;
  /** Where the figures were taken from; null: the user's own. */
  readonly source: string | null;
}

export type EventField = keyof EventDraft;

/** Per cent of usual, as the saved case bounds the factors (0.05 to 20 and 0.2 to 5). */
const CLEARANCE = { low: 5, high: 2000 };
const VOLUME = { low: 20, high: 500 };
/** As the saved case bounds it; the effect gets there in daily steps, so part-days would be rounded. */
const LONGEST_ONSET_D = 365;

export const EMPTY_EVENT: EventDraft = {
  kind: null,
  name: "",
  from: "",
  to: "",
  clearance: { text: "", unit: "%" },
  volume: { text: "", unit: "%" },
  onset: { text: "", unit: "d" },
  source: null,
};

/** An event as text that reads back to it. */
export function eventDraft({ kind, detail, from, to, effect }: Factor, zone: string): EventDraft {
  const isClearanceUsual = effect?.clearance === 1 && effect.volume !== undefined;
  return {
    kind,
    name: detail,
    from: instantTyped(from, zone),
    to: to === undefined ? "" : instantTyped(to, zone),
    clearance: percentDraft(isClearanceUsual ? undefined : effect?.clearance),
    volume: percentDraft(effect?.volume),
    onset: quantityDraft<"d">(effect?.onset ?? null, "d"),
    source: effect?.source ?? null,
  };
}

/** Characters a source may hold in a saved case. */
const SOURCE_LONGEST = 300;

/** The draft with an interaction of the record put in: its factor, onset and source, and its medicine where none is named yet. */
export function eventDraftWith(draft: EventDraft, interaction: Interaction, record: MedicineRecord): EventDraft {
  const { medicine, parameter, factor, onset } = interaction;
  const source = eventWords.sourceRecord(
    medicine,
    sourceTitle(record, factor.source),
    medicinesWords.bases[factor.basis],
  );
  const empty = EMPTY_EVENT.clearance;
  return {
    ...draft,
    name: draft.name.trim() === "" ? medicine : draft.name,
    clearance: parameter === "clearance" ? percentDraft(factor.value) : empty,
    volume: parameter === "volume" ? percentDraft(factor.value) : empty,
    // Part-days would be refused: the effect gets there in daily steps.
    onset: quantityDraft<"d">(
      onset && parameter === "clearance"
        ? { value: Math.max(1, Math.ceil(quantityConvert(onset, "d"))), unit: "d" }
        : null,
      "d",
    ),
    source: source.slice(0, SOURCE_LONGEST),
  };
}

function sourceTitle(record: MedicineRecord, id: string): string {
  const source = record.sources[id];
  return source ? [source.authors, source.title, source.year].filter((part) => part !== undefined).join(", ") : id;
}

function percentDraft(factor: number | undefined): QuantityDraft<"%"> {
  return quantityDraft<"%">(
    factor === undefined ? null : { value: Number((factor * 100).toPrecision(12)), unit: "%" },
    "%",
  );
}

/** A figure changed by hand is the user's own again. */
export function eventDraftChange(draft: EventDraft, change: Partial<EventDraft>): EventDraft {
  const isFigure = "clearance" in change || "volume" in change || "onset" in change;
  return { ...draft, ...change, ...(isFigure ? { source: null } : {}) };
}

/** The event, or its faults, each with the field as its path. */
export function eventDraftRead(draft: EventDraft, value: Case): Result<Factor> {
  const from = instantRead(draft.from, value.timeZone, value.now);
  const to = draft.to.trim() === "" ? null : instantRead(draft.to, value.timeZone, value.now);
  const clearance = percentRead(draft, "clearance", CLEARANCE);
  const volume = percentRead(draft, "volume", VOLUME);
  const onset = onsetRead(draft);
  const faults: Issue[] = [...clearance.faults, ...volume.faults, ...onset.faults];
  const words = (iso: string) => instantText(instantMs(iso), value.timeZone, "dayClock");

  if (draft.kind === null) faults.push(issue("event-kind-missing", {}, ["kind"]));
  if (draft.name.trim() === "" && (draft.kind === "other" || draft.kind === "interacting-medicine"))
    faults.push(issue("event-name-missing", {}, ["name"]));
  if (!from.ok) faults.push(...from.issues.map((one) => ({ ...one, path: ["from"] })));
  if (to && !to.ok) faults.push(...to.issues.map((one) => ({ ...one, path: ["to"] })));
  if (from.ok && to?.ok && instantMs(to.value) <= instantMs(from.value))
    faults.push(issue("event-ends-first", { from: words(from.value), to: words(to.value) }, ["to"]));

  const isEffect = !isDraftEmpty(draft.clearance) || !isDraftEmpty(draft.volume);
  if (!isEffect && !isDraftEmpty(draft.onset)) faults.push(issue("event-onset-alone", {}, ["onset"]));
  if (isEffect && clearance.value === undefined && clearance.faults.length === 0 && !isDraftEmpty(draft.onset))
    faults.push(issue("event-onset-alone", {}, ["onset"]));
  if (isEffect && from.ok) faults.push(...beforeFirstDose(from.value, value));

  if (faults.length > 0 || draft.kind === null || !from.ok || (to && !to.ok)) return fail(...faults);
  const effect = isEffect && {
    clearance: clearance.value ?? 1,
    ...(volume.value === undefined ? {} : { volume: volume.value }),
    ...(onset.days === undefined ? {} : { onset: { value: onset.days, unit: "d" as const } }),
    ...(draft.source === null ? {} : { source: draft.source }),
  };
  return succeed({
    kind: draft.kind,
    from: from.value,
    ...(to ? { to: to.value } : {}),
    detail: draft.name.trim(),
    ...(effect ? { effect } : {}),
  });
}

/** Per cent of usual as a factor; undefined when left empty. */
function percentRead(
  draft: EventDraft,
  field: "clearance" | "volume",
  { low, high }: { readonly low: number; readonly high: number },
): { readonly value?: number; readonly faults: readonly Issue[] } {
  if (isDraftEmpty(draft[field])) return { faults: [] };
  const read = quantityDraftRead(draft[field], ["%"]);
  if (!read.ok) return { faults: read.issues.map((one) => ({ ...one, path: [field] })) };
  const percent = read.value.value;
  if (!(percent >= low && percent <= high)) {
    const data = { found: percent, low, high };
    return {
      faults: [field === "clearance" ? issue("event-clearance", data, [field]) : issue("event-volume", data, [field])],
    };
  }
  if (percent === 100) return { faults: [issue("event-no-change", {}, [field])] };
  return { value: percent / 100, faults: [] };
}

function onsetRead(draft: EventDraft): { readonly days?: number; readonly faults: readonly Issue[] } {
  if (isDraftEmpty(draft.onset)) return { faults: [] };
  const read = quantityDraftRead(draft.onset, ["d"]);
  if (!read.ok) return { faults: read.issues.map((one) => ({ ...one, path: ["onset"] })) };
  const days = read.value.value;
  if (Number.isInteger(days) && days >= 1 && days <= LONGEST_ONSET_D) return { days, faults: [] };
  return { faults: [issue("event-onset", { found: days, most: LONGEST_ONSET_D }, ["onset"])] };
}

/** A change of the kinetics that starts before any dose: how much of it was there at the first dose would be a guess. */
function beforeFirstDose(from: string, value: Case): readonly Issue[] {
  const words = (ms: number) => instantText(ms, value.timeZone, "dayClock");
  const fromMs = instantMs(from);
  const givenMs = firstDoseMs(value);
  if (givenMs !== null) {
    return fromMs < givenMs ? [issue("event-before-dose", { at: words(fromMs), first: words(givenMs) }, ["from"])] : [];
  }
  const starts = value.options.flatMap((option) => option.lines.map((line) => instantMs(line.start)));
  if (starts.length === 0) return [];
  const firstMs = Math.min(...starts);
  return fromMs < firstMs ? [issue("event-before-option", { at: words(fromMs), first: words(firstMs) }, ["from"])] : [];
}
