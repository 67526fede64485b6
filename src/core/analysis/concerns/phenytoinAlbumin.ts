import { quantityConvert } from "../../units/index.ts";
import { type ConcernContext, type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { concentrationWindow } from "../optionReadings.ts";
import { windowDrawn } from "../windowDrawn.ts";

export type WindowSide = "below" | "inside" | "above";

/** Lower end of what is usual, g/dL (common practice): from it on the usual form corrects by little, which is told only where it changes what follows. */
const USUAL_FROM_G_PER_DL = 3.5;

/**
 * The latest level of phenytoin was measured beside a low albumin: as it would be with a normal one it may lie elsewhere in the target window, and
 * a dose raised on the measured figure would be too much. Levels drawn when the window is not meant are not held against it.
 */
export const phenytoinAlbumin: ConcernRule = (context) => {
  const corrected = context.patient.phenytoinForAlbumin;
  const level = context.levels.find(({ id }) => id === corrected?.levelId);
  if (!corrected?.isAlbuminLow || !level) return [];
  const { medicine, timeZone } = context.case;
  const { figure, form } = corrected;
  const { toxicFrom } = medicine;
  const toxicMgPerL = toxicFrom && quantityConvert(toxicFrom, "mg/L", medicine.molarMass.value);
  const ends = concentrationWindow(context.case);
  const sides = windowSidesForAlbumin(context, level.id);
  const isToxic = toxicMgPerL !== undefined && figure.value >= toxicMgPerL;
  const albuminGPerDl = figure.inputs.find(({ name }) => name === "albumin")?.value;
  const isSmall = form === "usual" && albuminGPerDl !== undefined && albuminGPerDl >= USUAL_FROM_G_PER_DL;
  if (isSmall && !isToxic && sides?.measuredSide === sides?.correctedSide) return [];
  const data = {
    atMs: clockMs(context, level.atH),
    zone: timeZone,
    measured: level.measured,
    corrected: figure.value,
    albuminGPerDl,
    form,
    formula: figure.formula,
    source: figure.source,
    basis: figure.basis,
    remarks: figure.remarks ?? [],
    window: sides && ends ? { ...ends, ...sides } : null,
    toxicMgPerL: isToxic ? toxicMgPerL : null,
  };
  return [concern("phenytoin-albumin", "check", { kind: "level", id: level.id }, data)];
};

/** On which side of the target window a level lies as measured and corrected for a low albumin; null where it is not corrected or not drawn for the window. */
export function windowSidesForAlbumin(
  context: Pick<ConcernContext, "case" | "given" | "levels" | "patient">,
  levelId: string,
): { readonly measuredSide: WindowSide; readonly correctedSide: WindowSide } | null {
  const corrected = context.patient.phenytoinForAlbumin;
  const level = context.levels.find(({ id }) => id === levelId);
  const ends = concentrationWindow(context.case);
  if (!corrected?.isAlbuminLow || corrected.levelId !== levelId || !level || !ends) return null;
  if (windowDrawn(context, level)?.kind !== "as-meant") return null;
  const side = (mgPerL: number): WindowSide => (mgPerL < ends.low ? "below" : mgPerL > ends.high ? "above" : "inside");
  return { measuredSide: side(level.measured), correctedSide: side(corrected.figure.value) };
}
