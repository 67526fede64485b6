import type { FittedParameter, IndividualFit } from "../../core/analysis/index.ts";
import {
  fitLine,
  fitWords,
  fitWorkingWords,
  flipFlopWords,
  learntDescription,
  levelTimes,
  parameterFigures,
  taughtSentence,
} from "../../core/messages/index.ts";
import { LearntChart } from "../chart/LearntChart.tsx";
import { learntScene } from "../chart/learntScene.ts";
import { RadioField } from "../ui/RadioField.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import "./LearntPanel.css";

/** What the levels taught of this patient, how it was worked out, and the two switches over it. */
export function LearntPanel() {
  const open = useWorkbench((state) => state.open);
  const edit = useWorkbench((state) => state.edit);
  const result = open?.analysis.result;
  if (!open || !result) return null;
  const { value } = open;
  const isReader = open.role === "reader";
  const { fit } = result;
  const setFit = (change: Partial<typeof value.fit>) => edit("fitSet", { fit: { ...value.fit, ...change } });
  return (
    <div className="learnt-panel">
      {fit.kind === "fitted" ? (
        <Learnt fit={fit.fit} levels={levelTimes(value, result)} />
      ) : (
        <p>{fitLine(fit, value.levels.length)}</p>
      )}
      <section className="learnt-switches">
        <RadioField
          label={fitWords.use}
          value={value.fit.use}
          choices={(["individual", "typical"] as const).map((use) => ({ value: use, label: fitWords.uses[use] }))}
          isReadOnly={isReader}
          onChoose={(use) => setFit({ use })}
        />
        <RadioField
          label={fitWords.residualModel}
          arrangement="list"
          value={value.fit.residualModel}
          choices={(["normal", "robust"] as const).map((model) => ({
            value: model,
            ...fitWords.residualModels[model],
          }))}
          isReadOnly={isReader}
          onChoose={(residualModel) => setFit({ residualModel })}
        />
      </section>
    </div>
  );
}

function Learnt({ fit, levels }: { fit: IndividualFit; levels: ReadonlyMap<string, string> }) {
  const flipFlop = flipFlopWords(fit.flipFlop);
  return (
    <>
      <p className="learnt-sentence">{taughtSentence(fit.parameters, fit.levelsUsed.length)}</p>
      <p className="learnt-key">
        <span className="learnt-key-prior" aria-hidden="true" /> {fitWords.prior}
        <span className="learnt-key-posterior" aria-hidden="true" /> {fitWords.posterior}
      </p>
      {fit.parameters.map((parameter) => (
        <Parameter key={parameter.symbol} parameter={parameter} />
      ))}
      {fit.halfLife && (
        <p>
          {fitWords.halfLife}: {fitWords.halfLifeIs(fit.halfLife)}
        </p>
      )}
      {flipFlop && <p>{flipFlop}</p>}
      <section>
        <h3>{fitWords.levelsUsed}</h3>
        <p>{fit.levelsUsed.map((id) => levels.get(id) ?? id).join("; ")}</p>
        <h3>{fitWords.levelsLeftOut}</h3>
        <p>{fit.levelsLeftOut.map((id) => levels.get(id) ?? id).join("; ") || fitWords.noLevelsLeftOut}</p>
      </section>
      <section>
        <h3>{fitWords.working}</h3>
        <ul className="learnt-working">
          {fitWorkingWords(fit).map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      </section>
    </>
  );
}

const SIZE = { width: 300, height: 118, margin: { top: 6, right: 14, bottom: 22, left: 14 } };

function Parameter({ parameter }: { parameter: FittedParameter }) {
  const { density, posterior, typical, mostLikely, symbol, words } = parameter;
  const scene = learntScene({
    ...SIZE,
    ...density,
    typical,
    mostLikely,
    interval: { low: posterior.q05, median: posterior.q50, high: posterior.q95 },
  });
  return (
    <section className="learnt" data-parameter={symbol}>
      <h3>
        {words} ({symbol})
      </h3>
      <div className="learnt-row">
        <LearntChart scene={scene} title={learntDescription(parameter)} />
        <dl className="learnt-figures">
          {parameterFigures(parameter).map(({ name, text }) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd>{text}</dd>
            </div>
          ))}
        </dl>
      </div>
    </section>
  );
}
