import { type DraftGroup, type DraftPath, draftTyped } from "../../../core/medicine/index.ts";
import { recordWords } from "../../../core/messages/index.ts";
import { UNIT_CODES, type UnitCode, unitSpoken } from "../../../core/units/index.ts";
import { Button } from "../../ui/Button.tsx";
import { capitalised } from "../capitalised.ts";
import { DraftChoice } from "./DraftChoice.tsx";
import { DraftProvenance } from "./DraftProvenance.tsx";
import { DraftText } from "./DraftText.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export interface DraftFigureProps {
  readonly path: DraftPath;
  readonly label: string;
  /** Units it may be in; the first where it is new. */
  readonly units: readonly UnitCode[];
  readonly description?: string;
  /** It can be added and taken away. */
  readonly isOptional?: boolean;
  /** An entry of a list, which can be taken away. */
  readonly isEntry?: boolean;
}

/** A figure: its value with its unit, its source, how it is known, a note. */
export function DraftFigure({
  path,
  label,
  units,
  description,
  isOptional = false,
  isEntry = false,
}: DraftFigureProps) {
  const { groupAt, change } = useDraft();
  const node = groupAt(path);
  if (!node) {
    if (!isOptional) return null;
    return (
      <div data-place={placeOf(path)}>
        <Button kind="quiet" onPress={() => change(path, figureNew(units[0] ?? "1"))}>
          {recordWords.add(label)}
        </Button>
      </div>
    );
  }
  const [unit] = units;
  const name = capitalised(label);
  return (
    <fieldset className="draft-figure" data-place={placeOf(path)}>
      <legend className="visually-hidden">{label}</legend>
      <div className="draft-figure-value">
        <DraftText
          path={[...path, "value"]}
          label={
            units.length === 1 && unit !== undefined && unit !== "1" ? `${name}, ${unitSpoken(unit, "screen")}` : name
          }
          {...(description === undefined ? {} : { description })}
        />
        {units.length > 1 ? (
          <DraftChoice
            path={[...path, "unit"]}
            label={recordWords.unitField}
            choices={units.map((value) => ({ value, label: unitSpoken(value, "screen") }))}
          />
        ) : null}
      </div>
      <DraftProvenance path={path} before={figureWas} />
      {isOptional || isEntry ? (
        <div className="draft-away">
          <Button kind="quiet" onPress={() => change(path, undefined)} name={recordWords.takeAwayName(label)}>
            {recordWords.takeAway}
          </Button>
        </div>
      ) : null}
    </fieldset>
  );
}

export function figureNew(unit: UnitCode): DraftGroup {
  return { value: "", unit, source: "", basis: "" };
}

function figureWas(was: DraftGroup): string {
  const unit = UNIT_CODES.find((each) => each === was.unit);
  return `${draftTyped(was.value)} ${unit ? unitSpoken(unit, "screen") : ""}`.trim();
}
