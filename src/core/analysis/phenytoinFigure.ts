import type { Case } from "../case/index.ts";
import type { MedicineRecord } from "../medicine/index.ts";
import {
  PHENYTOIN_FOR_ALBUMIN_RANGE,
  PHENYTOIN_KIDNEY_FAILURE_BELOW,
  phenytoinForAlbumin,
  phenytoinForAlbuminQuestion,
  phenytoinForAlbuminSource,
} from "../patient/index.ts";
import { issue } from "../result/index.ts";
import { instantMs } from "../time/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { PhenytoinForAlbumin } from "./analysisTypes.ts";
import { levelMgPerL } from "./levelResults.ts";
import { patientTraced } from "./patientTraced.ts";

const isWithin = (value: number, [low, high]: readonly [number, number]): boolean => value >= low && value <= high;

/** The latest measured level of phenytoin as it would be with a normal albumin; shown with its warning, never used in a fit. */
export function phenytoinFigure(
  value: Case,
  albuminGPerL: number | null,
  clearanceMlPerMin: number | null,
): PhenytoinForAlbumin | null {
  const level = value.levels
    .filter(
      (each) => each.kind === "measured" && each.excluded === undefined && instantMs(each.at) <= instantMs(value.now),
    )
    .sort((a, b) => instantMs(a.at) - instantMs(b.at))
    .at(-1);
  if (!isPhenytoin(value.medicine) || albuminGPerL === null || level === undefined) return null;
  const measuredMgPerL = levelMgPerL(level, value.medicine);
  const albuminGPerDl = quantityConvert({ value: albuminGPerL, unit: "g/L" }, "g/dL");
  const range = PHENYTOIN_FOR_ALBUMIN_RANGE;
  if (!isWithin(measuredMgPerL, range.measuredMgPerL) || !isWithin(albuminGPerDl, range.albuminGPerDl)) return null;
  const isKidneyFailure = clearanceMlPerMin !== null && clearanceMlPerMin < PHENYTOIN_KIDNEY_FAILURE_BELOW;
  const form = isKidneyFailure ? "kidney-failure" : "usual";
  const displacing = value.patient.factors.find(
    (factor) => factor.kind === "interacting-medicine" && /valpro/i.test(factor.detail),
  );
  const normalAlbumin = phenytoinForAlbuminQuestion(albuminGPerDl);
  return {
    levelId: level.id,
    levelAtMs: instantMs(level.at),
    form,
    isAlbuminLow: normalAlbumin === null,
    figure: patientTraced(
      phenytoinForAlbumin({ measuredMgPerL, albuminGPerDl, form }),
      "mg/L",
      phenytoinForAlbuminSource[form],
      [
        { name: "measured", value: measuredMgPerL, unit: "mg/L" },
        { name: "albumin", value: albuminGPerDl, unit: "g/dL" },
      ],
      issue("phenytoin-albumin-warning"),
      normalAlbumin,
      clearanceMlPerMin === null ? issue("phenytoin-albumin-kidney-unknown") : null,
      displacing ? issue("phenytoin-albumin-displaced", { detail: displacing.detail }) : null,
    ),
  };
}

/** By its name, so that a copy or a record of the user's own is recognised too. */
function isPhenytoin(record: MedicineRecord): boolean {
  return record.id === "phenytoin" || record.name.trim().toLowerCase() === "phenytoin";
}
