import type { PatientFigures as Figures, Traced } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { issueMessage, patientWords, tracedWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import "./PatientFigures.css";

export interface PatientFiguresProps {
  readonly value: Case;
  readonly figures: Figures | null;
}

/** What follows from the patient's values: result, formula with the numbers put in, source. */
export function PatientFigures({ value, figures }: PatientFiguresProps) {
  const { sex, age, height } = value.patient;
  const rate = figures?.filtrationRate;
  const corrected = figures?.phenytoinForAlbumin;
  const shown: readonly (readonly [string, Traced | null | undefined])[] = [
    [patientWords.bodyMassIndex, figures?.bodyMassIndex],
    [patientWords.idealWeight, figures?.idealWeight],
    [patientWords.adjustedWeight, figures?.adjustedWeight],
    [patientWords.leanWeight, figures?.leanWeight],
    [patientWords.bodySurface, figures?.bodySurface],
    [patientWords.bodySurfaceDuBois, figures?.bodySurfaceDuBois],
    [
      figures?.clearanceWeight
        ? `${patientWords.creatinineClearance}, ${patientWords.clearanceWeight[figures.clearanceWeight]}`
        : patientWords.creatinineClearance,
      figures?.creatinineClearance,
    ],
    [rate ? patientWords.filtrationRate[rate.equation] : "", rate?.perSurface],
    [patientWords.deindexed, rate?.deindexed],
    [
      corrected
        ? patientWords.phenytoinForAlbumin(
            instantText(corrected.levelAtMs, value.timeZone, "dayClock"),
            corrected.form === "kidney-failure",
          )
        : "",
      corrected?.figure,
    ],
  ];
  const missing = [
    ...(age ? [] : [patientWords.age.toLowerCase()]),
    ...(sex ? [] : ["sex"]),
    ...(height ? [] : [patientWords.height.toLowerCase()]),
    ...(figures?.weight ? [] : [patientWords.weight.toLowerCase()]),
    ...(figures?.creatinine ? [] : [patientWords.creatinine.toLowerCase()]),
  ];
  const known = shown.flatMap(([name, figure]) => (figure ? [{ name, figure }] : []));
  return (
    <section className="patient-figures" aria-labelledby="patient-figures-head">
      <h3 id="patient-figures-head">{patientWords.figures}</h3>
      {known.length === 0 ? <p className="entry-panel-soft">{patientWords.figuresNone}</p> : null}
      <dl>
        {known.map(({ name, figure }) => (
          <div key={name} className="patient-figures-one">
            <dt>{name}</dt>
            <dd className="patient-figures-value">
              {quantityPrint({ value: figure.value, unit: figure.unit }, { style: "screen", significant: 3 })}
            </dd>
            <dd className="patient-figures-working">{tracedWords(figure)}</dd>
            {(figure.remarks ?? []).map((remark) => (
              <dd key={remark.code} className="patient-figures-remark">
                {issueMessage(remark)}
              </dd>
            ))}
            <dd className="patient-figures-source">
              {patientWords.source}: {figure.source} ({figure.basis})
            </dd>
          </div>
        ))}
      </dl>
      {missing.length > 0 ? <p className="entry-panel-soft">{patientWords.missing(missing)}</p> : null}
    </section>
  );
}
