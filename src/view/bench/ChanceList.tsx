import { type Analysis, type WindowChance, windowDrawH } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import {
  chanceWords,
  fitWords,
  lowestBeforeWords,
  neverSteadyWords,
  windowChanceWords,
} from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { optionStyle } from "../chart/ProfileChart.tsx";
import { OptionBadge } from "./OptionBadge.tsx";
import "./ChanceList.css";

interface ChanceListProps {
  readonly value: Case;
  readonly analysis: Analysis;
  readonly onLit: (option: string | null) => void;
}

/** For each option the chance of lying below, within and above the window: at steady state, and over the span of the readings. */
export function ChanceList({ value, analysis, onLit }: ChanceListProps) {
  const { window } = value;
  if (!window || analysis.options.every((option) => option.individual === null)) return null;
  const clock = (h: number) => instantText(analysis.clock.originMs + h * 3_600_000, value.timeZone, "dayClock");
  const drawH = windowDrawH(value);
  /** What is to be said beside the chances, each with the options it is said of. */
  const remarks = new Map<string, string[]>();
  for (const { id, individual } of analysis.options) {
    if (!individual) continue;
    for (const sentence of [
      neverSteadyWords(individual),
      lowestBeforeWords(window.quantity, individual.span),
      drawH !== null && individual.steadyState?.timed === null ? fitWords.chanceHourNever : null,
    ]) {
      if (sentence !== null) remarks.set(sentence, [...(remarks.get(sentence) ?? []), id]);
    }
  }
  return (
    <section className="chances" aria-labelledby="chances-head">
      <h2 className="readings-head" id="chances-head">
        {fitWords.chanceHead(windowChanceWords(window.quantity, drawH))}
      </h2>
      <ul className="chances-list">
        {analysis.options.map(({ id, individual }, i) => {
          if (!individual) return null;
          const { steadyChance, span } = individual;
          const about = [
            ...(steadyChance ? [{ when: fitWords.chanceSteady, chance: steadyChance }] : []),
            ...(span.chance ? [{ when: `${clock(span.fromH)} to ${clock(span.toH)}`, chance: span.chance }] : []),
          ];
          return (
            <li
              key={id}
              className="chance"
              onPointerEnter={() => onLit(id)}
              onPointerLeave={() => onLit(null)}
              data-chance={id}
            >
              <OptionBadge id={id} index={i} isChosen={value.options[i]?.chosen ?? false} />
              <span className="visually-hidden">{fitWords.chanceOption(id)}: </span>
              <div className="chance-rows">
                {about.map(({ when, chance }) => (
                  <div key={when}>
                    <p className="chance-words">
                      <strong>{chanceWords(chance.within)}</strong> {when}
                      <span className="chance-beside">
                        {" "}
                        {fitWords.chanceBeside(chanceWords(chance.below), chanceWords(chance.above))}
                      </span>
                    </p>
                    <ChanceBar chance={chance} style={optionStyle(i)} />
                  </div>
                ))}
              </div>
            </li>
          );
        })}
      </ul>
      {[...remarks].map(([sentence, options]) => (
        <p key={sentence} className="chance-beside">
          {fitWords.ofOptions(options, sentence)}
        </p>
      ))}
      <p className="chance-beside">{fitWords.chanceTaken}</p>
    </section>
  );
}

/** Hatched below, full within, open above; the words stand beside it. */
function ChanceBar({ chance, style }: { chance: WindowChance; style: string }) {
  return (
    <div className={`chance-bar chance-bar-${style}`} aria-hidden="true">
      <span className="chance-bar-below" style={{ flexGrow: chance.below }} />
      <span className="chance-bar-within" style={{ flexGrow: chance.within }} />
      <span className="chance-bar-above" style={{ flexGrow: chance.above }} />
    </div>
  );
}
