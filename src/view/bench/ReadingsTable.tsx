import { useMemo } from "react";
import type { Analysis } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { OptionBadge } from "./OptionBadge.tsx";
import type { ShownUnit } from "./shownUnit.ts";
import "./ReadingsTable.css";
import { readingsGroups } from "./readingsRows.ts";

interface ReadingsTableProps {
  readonly value: Case;
  readonly analysis: Analysis;
  readonly unit: ShownUnit;
  readonly onWorking: (rowId: string, option: string) => void;
}

/** The derived figures, one column an option; press one for its working. */
export function ReadingsTable({ value, analysis, unit, onWorking }: ReadingsTableProps) {
  const groups = useMemo(() => readingsGroups(value, analysis, unit), [value, analysis, unit]);
  return groups.map((group) => (
    <section key={group.id} className="readings">
      <table className="readings-table">
        <caption className="readings-head">{group.head}</caption>
        <thead>
          <tr>
            <th scope="col">
              <span className="visually-hidden">Reading</span>
            </th>
            {value.options.map((option, i) => (
              <th key={option.id} scope="col">
                <OptionBadge id={option.id} index={i} isChosen={option.chosen} />
                <span className="visually-hidden">Option {option.id}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {group.rows
            .filter((row) => row.cells.some((cell) => cell !== null))
            .map((row) => (
              <tr key={row.id} data-reading={row.id}>
                <th scope="row">{row.name}</th>
                {row.cells.map((cell, i) => (
                  <td key={analysis.options[i]!.id}>
                    {cell === null ? (
                      <span className="readings-none">none</span>
                    ) : (
                      <button
                        type="button"
                        className="readings-cell"
                        onClick={() => onWorking(row.id, analysis.options[i]!.id)}
                      >
                        {cell.text}
                        {cell.sub && <span className="readings-sub">{cell.sub}</span>}
                      </button>
                    )}
                  </td>
                ))}
              </tr>
            ))}
        </tbody>
      </table>
    </section>
  ));
}
