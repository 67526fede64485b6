import type { RecordProfile } from "../../../core/analysis/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { numberPrint, quantityPrint, type UnitCode, unitSpoken } from "../../../core/units/index.ts";
import { type DataColumn, DataTable } from "../../ui/DataTable.tsx";
import type { TrialUnit } from "./trialUnit.ts";

export interface TrialReadingsProps {
  readonly profiles: readonly { readonly id: string; readonly name: string; readonly profile: RecordProfile }[];
  readonly unit: TrialUnit;
}

interface Row {
  readonly id: string;
  readonly name: string;
  readonly value: (profile: RecordProfile) => string;
}

const DIGITS = 3;

/** The figures of one or more typical curves side by side. */
export function TrialReadings({ profiles, unit }: TrialReadingsProps) {
  const rows = [...readingRows(unit), ...parameterRows(profiles.map(({ profile }) => profile))];
  const columns: DataColumn<Row>[] = [
    { id: "reading", head: recordWords.readings, isRowHead: true, cell: (row) => row.name },
    ...profiles.map(({ id, name, profile }) => ({
      id,
      head: name,
      align: "end" as const,
      cell: (row: Row) => row.value(profile),
    })),
  ];
  return (
    <DataTable caption={recordWords.readings} isCaptionHidden rows={rows} rowKey={(row) => row.id} columns={columns} />
  );
}

function readingRows({ unit, factor }: TrialUnit): Row[] {
  const words = recordWords.reading;
  const hours = (value: number) => quantityPrint({ value, unit: "h" }, { style: "screen", significant: DIGITS });
  const level = (value: number) =>
    quantityPrint({ value: value * factor, unit }, { style: "screen", significant: DIGITS });
  const exposure = `${unitSpoken(unit, "screen").replace("/", "·h/")}`;
  const of = (read: (readings: NonNullable<RecordProfile["readings"]>) => string) => (profile: RecordProfile) =>
    profile.readings ? read(profile.readings) : recordWords.none;
  return [
    { id: "peak", name: words.peak, value: of(({ peak }) => level(peak)) },
    { id: "peakAfter", name: words.peakAfter, value: of(({ peakAfterDoseH }) => hours(peakAfterDoseH)) },
    { id: "lowest", name: words.lowest, value: of(({ lowest }) => level(lowest)) },
    { id: "average", name: words.average, value: of(({ average }) => level(average)) },
    {
      id: "auc24",
      name: words.auc24,
      value: of(({ auc24 }) => `${numberPrint(auc24 * factor, { significant: DIGITS })}\u00a0${exposure}`),
    },
    {
      id: "halfLife",
      name: words.halfLife,
      value: ({ halfLifeH }) => (halfLifeH === null ? recordWords.halfLifeVaries : hours(halfLifeH)),
    },
    { id: "timeTo90", name: words.timeTo90, value: of(({ timeTo90H }) => hours(timeTo90H)) },
    {
      id: "accumulation",
      name: words.accumulation,
      value: of(({ accumulation }) => numberPrint(accumulation, { significant: DIGITS })),
    },
  ];
}

/** The kinetics' own figures: each that any of the profiles has. */
function parameterRows(profiles: readonly RecordProfile[]): Row[] {
  const rows = new Map<string, Row>();
  for (const { parameters } of profiles) {
    for (const { symbol, words } of parameters) {
      rows.set(symbol, {
        id: symbol,
        name: recordWords.formula(words, symbol),
        value: (profile) => {
          const found = profile.parameters.find((each) => each.symbol === symbol);
          return found ? figure(found.value, found.unit) : recordWords.none;
        },
      });
    }
  }
  return [...rows.values()];
}

function figure(value: number, unit: UnitCode): string {
  return quantityPrint({ value, unit }, { style: "screen", significant: DIGITS });
}
