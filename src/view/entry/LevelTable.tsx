import { type FormEvent, useState } from "react";
import type { LevelResult } from "../../core/analysis/index.ts";
import type { Case, Level } from "../../core/case/index.ts";
import { fitWords, issueMessage, levelWords } from "../../core/messages/index.ts";
import { issue } from "../../core/result/index.ts";
import { instantMs, instantText } from "../../core/time/index.ts";
import { numberPrint, quantityConvert, quantityPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { TextField } from "../ui/TextField.tsx";
import { LevelFindings } from "./LevelFindings.tsx";
import { LevelForm } from "./LevelForm.tsx";

/** Which level's form is open: to change it, or to say why it is left out. */
export interface OpenLevel {
  readonly id: string;
  readonly form: "change" | "reason";
}

export interface LevelTableProps {
  readonly value: Case;
  readonly results: readonly LevelResult[];
  readonly isReadOnly: boolean;
  /** Open from the start. */
  readonly opened?: OpenLevel;
  readonly onChange: (level: Level) => void;
  readonly onExclude: (id: string, reason: string | null) => void;
  readonly onRemove: (id: string) => void;
}

/** Every level with what was predicted at that time; one left out stays, with its reason. */
export function LevelTable(props: LevelTableProps) {
  const { value, results, isReadOnly, onChange, onExclude, onRemove } = props;
  const [opened, setOpened] = useState<OpenLevel | null>(props.opened ?? null);
  const openedLevel = value.levels.find((level) => level.id === opened?.id);
  const resultOf = (level: Level) => results.find((one) => one.id === level.id);
  const hasFit = results.some((result) => result.fit !== null);
  const convert = (level: Level, amount: number) =>
    quantityConvert({ value: amount, unit: "mg/L" }, level.quantity.unit, value.medicine.molarMass.value);
  /** A concentration in mg/L as the level's own unit has it, to as many decimals as `beside` needs for three digits. */
  const inUnitOf = (level: Level, mgPerL: number, beside: number) => {
    const decimals = Math.min(6, Math.max(0, 2 - Math.floor(Math.log10(Math.abs(convert(level, beside)) || 1))));
    return quantityPrint({ value: convert(level, mgPerL), unit: level.quantity.unit }, { style: "screen", decimals });
  };
  const differenceOf = (level: Level) => {
    const { difference = null, predicted = null } = resultOf(level) ?? {};
    if (difference === null) return "";
    return `${difference > 0 ? "+" : ""}${inUnitOf(level, difference, predicted ?? difference)}`;
  };
  const figureOf = (level: Level, mgPerL: number) => numberPrint(convert(level, mgPerL), { significant: 3 });
  const printOf = (level: Level, mgPerL: number) =>
    quantityPrint({ value: convert(level, mgPerL), unit: level.quantity.unit }, { style: "screen", significant: 3 });
  const nameOf = (level: Level) =>
    `${measuredWords(level)} ${instantText(instantMs(level.at), value.timeZone, "dayClock")}`;
  return (
    <>
      <DataTable
        caption={levelWords.list}
        rows={value.levels}
        rowKey={(level) => level.id}
        isRowFaint={(level) => level.excluded !== undefined}
        empty={levelWords.none}
        columns={[
          {
            id: "drawn",
            head: levelWords.drawn,
            isRowHead: true,
            cell: (level) => (
              <span>
                {instantText(instantMs(level.at), value.timeZone, "dayClock")}
                {level.excluded === undefined ? null : (
                  <span className="level-entry-left">{levelWords.left(level.excluded)}</span>
                )}
              </span>
            ),
          },
          {
            id: "after",
            head: levelWords.afterDose,
            align: "end",
            cell: (level) => {
              const hours = resultOf(level)?.afterDoseH ?? null;
              return hours === null ? "" : `${numberPrint(hours, { decimals: 1 })}\u00a0h`;
            },
          },
          { id: "measured", head: levelWords.measuredHead, align: "end", cell: measuredWords },
          {
            id: "predicted",
            head: hasFit ? fitWords.typical : levelWords.predicted,
            align: "end",
            cell: (level) => {
              const predicted = resultOf(level)?.predicted ?? null;
              if (predicted === null) return "";
              const shown = inUnitOf(level, predicted, predicted);
              return hasFit ? <Figure text={shown} under={differenceOf(level)} /> : shown;
            },
          },
          ...(hasFit
            ? []
            : [{ id: "difference", head: levelWords.difference, align: "end" as const, cell: differenceOf }]),
          ...(hasFit
            ? [
                {
                  id: "individual",
                  head: fitWords.individual,
                  align: "end" as const,
                  cell: (level: Level) => {
                    const fit = resultOf(level)?.fit;
                    if (!fit) return "";
                    const { q05, q50, q95 } = fit.predicted;
                    return (
                      <Figure
                        text={printOf(level, q50)}
                        under={`${figureOf(level, q05)} to ${figureOf(level, q95)}`}
                        isMain
                      />
                    );
                  },
                },
              ]
            : []),
          {
            id: "actions",
            head: levelWords.actions,
            isHeadHidden: true,
            align: "end",
            cell: (level) =>
              isReadOnly ? null : (
                <span className="level-entry-actions">
                  <Button
                    kind="quiet"
                    onPress={() => setOpened({ id: level.id, form: "change" })}
                    name={`${levelWords.change} ${nameOf(level)}`}
                  >
                    {levelWords.change}
                  </Button>
                  {level.excluded === undefined ? (
                    <Button
                      kind="quiet"
                      onPress={() => setOpened({ id: level.id, form: "reason" })}
                      name={`${levelWords.leaveOut} ${nameOf(level)}`}
                    >
                      {levelWords.leaveOut}
                    </Button>
                  ) : (
                    <Button
                      kind="quiet"
                      onPress={() => onExclude(level.id, null)}
                      name={`${levelWords.takeBack} ${nameOf(level)}`}
                    >
                      {levelWords.takeBack}
                    </Button>
                  )}
                  <Button
                    kind="quiet"
                    onPress={() => onRemove(level.id)}
                    name={`${levelWords.remove} ${nameOf(level)}`}
                  >
                    {levelWords.remove}
                  </Button>
                </span>
              ),
          },
        ]}
      />
      {openedLevel && opened?.form === "change" && !isReadOnly ? (
        <div className="entry-panel-inset">
          <LevelForm
            key={openedLevel.id}
            value={value}
            level={openedLevel}
            word={levelWords.save}
            onCancel={() => setOpened(null)}
            onLevel={(changed) => {
              const { id, excluded } = openedLevel;
              onChange({ ...changed, id, ...(excluded === undefined ? {} : { excluded }) });
              setOpened(null);
            }}
          />
        </div>
      ) : null}
      {openedLevel && opened?.form === "reason" && !isReadOnly ? (
        <ReasonForm
          key={openedLevel.id}
          name={nameOf(openedLevel)}
          onCancel={() => setOpened(null)}
          onSave={(reason) => {
            onExclude(openedLevel.id, reason);
            setOpened(null);
          }}
        />
      ) : null}
      <LevelFindings value={value} results={results} nameOf={nameOf} print={printOf} figure={figureOf} />
    </>
  );
}

/** A figure with what goes with it under it, smaller. */
function Figure({ text, under, isMain = false }: { text: string; under: string; isMain?: boolean }) {
  return (
    <span className="level-entry-figure">
      {isMain ? <strong>{text}</strong> : <span>{text}</span>}
      <span className="level-entry-interval">{under}</span>
    </span>
  );
}

/** In the unit it was reported in. */
function measuredWords(level: Level): string {
  const shown = quantityPrint(level.quantity, { style: "screen" });
  return level.kind === "below-limit" ? levelWords.below(shown) : shown;
}

function ReasonForm({
  name,
  onSave,
  onCancel,
}: {
  readonly name: string;
  readonly onSave: (reason: string) => void;
  readonly onCancel: () => void;
}) {
  const [reason, setReason] = useState("");
  const [isSent, setSent] = useState(false);
  const send = (event: FormEvent) => {
    event.preventDefault();
    setSent(true);
    if (reason.trim()) onSave(reason.trim());
  };
  return (
    <form className="entry-panel-form entry-panel-inset" onSubmit={send} noValidate>
      <p className="entry-panel-soft">{name}</p>
      <TextField
        label={levelWords.reason}
        value={reason}
        onChange={setReason}
        maxLength={200}
        hasInitialFocus
        description={levelWords.reasonHelp}
        fault={isSent && !reason.trim() ? issueMessage(issue("level-reason-missing")) : undefined}
      />
      <div className="entry-panel-buttons">
        <Button type="submit">{levelWords.reasonSave}</Button>
        <Button kind="quiet" onPress={onCancel}>
          {levelWords.cancel}
        </Button>
      </div>
    </form>
  );
}
