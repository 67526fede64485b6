import fc from "fast-check";
import {
  type Case,
  caseEditTry,
  EDIT_NAMES,
  type EditArguments,
  type EditName,
  optionNextId,
} from "../../../src/core/case/index.ts";
import { doseLineCount, doseLineScheduledMs } from "../../../src/core/regimen/index.ts";
import { instantIso } from "../../../src/core/time/index.ts";
import { recordOf } from "../medicine/recordOf.ts";

/** One random edit: its name and numbers from which its arguments are made, fitting whatever case it meets. */
export interface EditStep {
  readonly name: EditName;
  readonly picks: readonly number[];
}

export const editStep: fc.Arbitrary<EditStep> = fc.record({
  name: fc.constantFrom(...EDIT_NAMES),
  picks: fc.array(fc.nat(), { minLength: 6, maxLength: 6 }),
});

type Picked = { readonly [N in EditName]?: EditArguments<N> };

/** The case after the edit; the same case where the edit has nothing to act on. `seen` notes the edits that were made. */
export function stepApply(value: Case, step: EditStep, seen?: Set<EditName>): Case {
  const args = argumentsFor(value, step);
  const tried = args && caseEditTry(value, step.name, args);
  if (!tried?.ok) return value;
  seen?.add(step.name);
  return tried.value;
}

function argumentsFor(
  value: Case,
  { name, picks: [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0] }: EditStep,
): EditArguments<EditName> | undefined {
  const of = <T>(list: readonly T[], n: number): T | undefined => list[n % Math.max(1, list.length)];
  const at = (n: number) => instantIso(Date.UTC(2026, 1, 25) + (n % (20 * 96)) * 900_000, value.timeZone);
  const lane = of(["given", ...value.options.map((each) => each.id)], a) as string;
  const lines = lane === "given" ? value.given : (value.options.find((each) => each.id === lane)?.lines ?? []);
  const line = of(lines, b);
  const index = line ? c % Math.min(12, Math.max(1, doseLineCount(line, value.timeZone))) : 0;
  const newLine = (n: number) => ({
    id: `n${n}-${d}`,
    product: of(value.medicine.products, n)?.id ?? "",
    amount: { value: 50 * (1 + (n % 8)), unit: "mg" as const },
    start: at(n + e),
    ...[
      {},
      { repeat: { every: { value: 4 + (n % 20), unit: "h" as const }, count: 1 + (n % 9) } },
      { repeat: { clock: ["08:00", "22:00"], days: 1 + (n % 9) } },
      { repeat: { clock: ["20:00"], days: 7 + (n % 9), weekdays: [1, 3 + (n % 5)] } },
    ][n % 4],
  });
  const option = of(value.options, b);
  const level = of(value.levels, a);
  const observation = of(value.patient.observations, a);
  const newLevel = {
    id: `level-${d}`,
    at: at(b),
    quantity: { value: 1 + (c % 20), unit: "mg/L" as const },
    kind: "measured" as const,
  };
  const newObservation = {
    id: `o-${d}`,
    at: at(b),
    kind: "weight" as const,
    quantity: { value: 40 + (c % 60), unit: "kg" as const },
  };
  const newFactor = {
    kind: of(["smoking", "interacting-medicine", "other"] as const, b) ?? ("other" as const),
    from: at(c),
    ...(d % 3 === 0 && { to: at(c + 1 + (e % 90)) }),
    detail: `factor ${d}`,
    ...(d % 2 && {
      effect: {
        clearance: 0.5 + (e % 4) / 2,
        ...(e % 2 && { volume: 1.1 }),
        ...(f % 2 && { onset: { value: 1 + (f % 14), unit: "d" as const } }),
      },
    }),
  };
  const made: Picked = {
    caseRename: { label: `label ${a}` },
    notesSet: { notes: `notes ${a}` },
    nowSet: { at: at(a) },
    timeZoneSet: { timeZone: of(["Europe/Lisbon", "Australia/Lord_Howe", "America/St_Johns"], a) as string },
    fitSet: { fit: { use: a % 2 ? "typical" : "individual", residualModel: b % 2 ? "normal" : "robust" } },
    sexSet: { sex: of(["female", "male", null] as const, a) ?? null },
    ageSet: { age: a % 3 === 0 ? null : { value: 20 + (b % 80), unit: "a" } },
    heightSet: { height: a % 3 === 0 ? null : { value: 140 + (b % 60), unit: "cm" } },
    observationAdd: { observation: newObservation },
    ...(observation && {
      observationChange: { observation: { ...newObservation, id: observation.id } },
      observationRemove: { id: observation.id },
    }),
    ...(value.patient.factors.length < 20 && { factorAdd: { factor: newFactor } }),
    ...(value.patient.factors.length > 0 && {
      factorChange: { index: c % value.patient.factors.length, factor: newFactor },
      factorRemove: { index: c % value.patient.factors.length },
    }),
    medicineSet:
      a % 2
        ? { record: recordOf("demoxiline"), products: { "tablet-12h": "capsule-slow", solution: "liquid" } }
        : { record: recordOf("theophylline"), products: { "capsule-slow": "tablet-12h", liquid: "solution" } },
    windowSet: {
      window:
        a % 3 === 0
          ? null
          : {
              quantity: "peak",
              low: { value: 1 + (b % 9), unit: "mg/L" },
              high: { value: 12, unit: "mg/L" },
              basis: "",
            },
    },
    linesAdd: { lane, lines: [newLine(c), { ...newLine(f), id: `second-${d}` }] },
    levelAdd: { level: newLevel },
    ...(level && {
      levelChange: { level: { ...newLevel, id: level.id } },
      levelMove: { id: level.id, at: at(c) },
      levelRevalue: { id: level.id, number: 1 + (d % 20) },
      levelRemove: { id: level.id },
      levelExclude: { id: level.id, reason: b % 2 ? "reason" : null },
    }),
    ...(value.options.length < 12 && { optionAdd: { id: optionNextId(value), label: `option ${a}` } }),
    ...(option && {
      ...(value.options.length < 12 && {
        optionDuplicate: { id: option.id, newId: optionNextId(value), label: "copy" },
      }),
      optionRename: { id: option.id, label: `renamed ${a}` },
      optionRemove: { id: option.id },
      optionChoose: { id: c % 4 === 0 ? null : option.id },
    }),
    ...(line && {
      lineChange: { lane, line: { ...newLine(c), id: line.id } },
      lineReplace: { lane, id: line.id, lines: [newLine(c)] },
      lineRemove: { lane, id: line.id },
      doseMove: {
        lane,
        lineId: line.id,
        index,
        at: instantIso(doseLineScheduledMs(line, index, value.timeZone) + ((d % 200) - 100) * 900_000, value.timeZone),
      },
      doseMark: { lane, lineId: line.id, index, status: d % 2 ? "missed" : "taken" },
      ...(line.except?.find((each) => each.index === index)?.status !== "missed" && {
        doseScale: {
          lane,
          lineId: line.id,
          ...(e % 2 && { index }),
          amount: { value: 25 * (1 + (d % 20)), unit: "mg" },
        },
      }),
      ...(line.repeat && {
        lineStretch: {
          lane,
          lineId: line.id,
          ...(d % 5 && ("every" in line.repeat ? { count: 1 + (e % 12) } : { days: 1 + (e % 12) })),
        },
      }),
    }),
  };
  return made[name] as EditArguments<EditName> | undefined;
}
