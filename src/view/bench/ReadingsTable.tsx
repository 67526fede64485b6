import { useMemo } from "react";
import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { fitWords } from "../../core/messages/index.ts";
import { OptionBadge } from "./OptionBadge.tsx";
import type { ShownUnit } from "./shownUnit.ts";
import "./ReadingsTable.css";
import { hasIndividual, type ReadingCell, type ReadingPair, readingsGroups } from "./readingsRows.ts";
import { isSteadyWithheld, steadyWithheldNotes } from "./steadyWithheld.ts";

/** Whose figure a reading is. */
export type ReadingOf = "typical" | "individual";

interface ReadingsTableProps {
  readonly value: Case;
  readonly analysis: Analysis;
  readonly unit: ShownUnit;
  readonly onWorking: (rowId: string, option: string, of: ReadingOf) => void;
  /** The option pointed at, or none. */
  readonly onLit: (option: string | null) => void;
}

/** More options than this have no room for two columns each: typical and this patient stand under each other. */
const SIDE_BY_SIDE = 2;

/** The derived figures, one column an option; typical and this patient where there is a fit; press one for its working. */
export function ReadingsTable({ value, analysis, unit, onWorking, onLit }: ReadingsTableProps) {
  const groups = useMemo(() => readingsGroups(value, analysis, unit), [value, analysis, unit]);
  const hasOwn = hasIndividual(analysis);
  const notes = steadyWithheldNotes(analysis);
  const isSplit = hasOwn && value.options.length <= SIDE_BY_SIDE;
  return groups.map((group) => (
    <section key={group.id} className="readings">
      {group.id === "steady" &&
        notes.map((note) => (
          <p key={note} className="readings-note">
            {note}
          </p>
        ))}
      <table className={`readings-table${hasOwn ? " readings-table-own" : ""}`}>
        <caption className="readings-head">{group.head}</caption>
        <thead>
          <tr>
            <th scope="col" rowSpan={isSplit ? 2 : 1}>
              <span className="visually-hidden">Reading</span>
            </th>
            {value.options.map((option, i) => (
              <th key={option.id} scope={isSplit ? "colgroup" : "col"} colSpan={isSplit ? 2 : 1}>
                <OptionBadge id={option.id} index={i} isChosen={option.chosen} />
                <span className="visually-hidden">Option {option.id}</span>
              </th>
            ))}
          </tr>
          {isSplit && (
            <tr className="readings-whose">
              {value.options.flatMap((option) => [
                <th key={`${option.id} typical`} scope="col">
                  {fitWords.typical}
                </th>,
                <th key={`${option.id} individual`} scope="col">
                  {fitWords.individual}
                </th>,
              ])}
            </tr>
          )}
        </thead>
        <tbody>
          {group.rows
            .filter((row) => row.cells.some((cell) => cell.typical !== null || cell.individual !== null))
            .map((row) => (
              <tr key={row.id} data-reading={row.id}>
                <th scope="row">{row.name}</th>
                {row.cells.flatMap((pair, i) => {
                  const found = analysis.options[i]!;
                  const option = found.id;
                  const isWithheld = isSteadyWithheld(row.id, found);
                  const lit = { onPointerEnter: () => onLit(option), onPointerLeave: () => onLit(null) };
                  const cell = (of: ReadingOf) => (
                    <Reading
                      cell={pair[of]}
                      of={of}
                      isWithheld={isWithheld}
                      onPress={() => onWorking(row.id, option, of)}
                    />
                  );
                  if (isSplit && pair.isShared) {
                    return [
                      <td key={option} colSpan={2} {...lit}>
                        {cell("typical")}
                      </td>,
                    ];
                  }
                  if (isSplit) {
                    return [
                      <td key={`${option} typical`} {...lit}>
                        {cell("typical")}
                      </td>,
                      <td key={`${option} individual`} {...lit}>
                        {cell("individual")}
                      </td>,
                    ];
                  }
                  return [
                    <td key={option} {...lit}>
                      {hasOwn ? <Stacked pair={pair} isWithheld={isWithheld} cell={cell} /> : cell("typical")}
                    </td>,
                  ];
                })}
              </tr>
            ))}
        </tbody>
      </table>
    </section>
  ));
}

/** This patient's figure with the typical one under it, named. */
interface StackedProps {
  readonly pair: ReadingPair;
  readonly isWithheld: boolean;
  readonly cell: (of: ReadingOf) => React.ReactNode;
}

function Stacked({ pair, isWithheld, cell }: StackedProps) {
  const hasOwn = pair.individual !== null || isWithheld;
  return (
    <>
      {hasOwn && cell("individual")}
      {hasOwn ? (
        <span className="readings-under">
          {fitWords.typical} {cell("typical")}
        </span>
      ) : pair.isShared || pair.typical === null ? (
        cell("typical")
      ) : (
        <span className="readings-under">
          {fitWords.typical} {cell("typical")}
        </span>
      )}
    </>
  );
}

interface ReadingProps {
  readonly cell: ReadingCell | null;
  readonly of: ReadingOf;
  readonly isWithheld: boolean;
  readonly onPress: () => void;
}

function Reading({ cell, of, isWithheld, onPress }: ReadingProps) {
  if (cell === null) {
    if (of === "typical") return <span className="readings-none">none</span>;
    return isWithheld ? <span className="readings-none">{fitWords.notGiven}</span> : null;
  }
  return (
    <button
      type="button"
      className={`readings-press ${of === "typical" ? "readings-cell" : "readings-own"}`}
      onClick={onPress}
    >
      {cell.text}
      {cell.sub && (
        <span className="readings-sub">
          {of === "individual" && <span className="visually-hidden">{fitWords.interval} </span>}
          {cell.sub}
        </span>
      )}
    </button>
  );
}
