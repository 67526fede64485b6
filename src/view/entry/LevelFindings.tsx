import type { LevelResult } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { fitWords, levelFitWords } from "../../core/messages/index.ts";

export interface LevelFindingsProps {
  readonly value: Case;
  readonly results: readonly LevelResult[];
  /** The name of a level, as in the table. */
  readonly nameOf: (level: Case["levels"][number]) => string;
  /** mg/L in the level's own unit, with and without it. */
  readonly print: (level: Case["levels"][number], mgPerL: number) => string;
  readonly figure: (level: Case["levels"][number], mgPerL: number) => string;
}

/** What each level did to the fit and the fit says of it: residual, influence, the forecast made before it. */
export function LevelFindings({ value, results, nameOf, print, figure }: LevelFindingsProps) {
  const found = value.levels.flatMap((level) => {
    const result = results.find(({ id }) => id === level.id);
    return result?.fit ? [{ level, result }] : [];
  });
  if (found.length === 0) return null;
  return (
    <section className="level-findings" aria-labelledby="level-findings-head">
      <h3 id="level-findings-head">{fitWords.findingsHead}</h3>
      <dl>
        {found.map(({ level, result }) => (
          <div key={level.id} className="level-finding" data-level={level.id}>
            <dt>
              {nameOf(level)}
              {level.excluded === undefined ? null : (
                <span className="level-entry-left">{fitWords.leftOut(level.excluded)}</span>
              )}
            </dt>
            {levelFitWords(
              result,
              (mgPerL) => print(level, mgPerL),
              (mgPerL) => figure(level, mgPerL),
            ).map((line) => (
              <dd key={line}>{line}</dd>
            ))}
          </div>
        ))}
      </dl>
    </section>
  );
}
