import type { ReactNode } from "react";
import type { Analysis } from "../../core/analysis/index.ts";
import { concentrationUnit, productOf } from "../../core/medicine/index.ts";
import { benchWords, editLabel, windowAboutWords, windowRangeWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import { numberPrint, quantityPrint } from "../../core/units/index.ts";
import type { OpenCase } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import type { BenchPanelKind } from "./BenchPanel.tsx";
import "./CaseStrip.css";

interface CaseStripProps {
  readonly open: OpenCase;
  readonly analysis: Analysis | null;
  readonly onPanel: (panel: BenchPanelKind) => void;
  readonly onPrint: () => void;
}

/** The case in one line: who, which medicine, which window, and whether it is on disk. */
export function CaseStrip({ open, analysis, onPanel, onPrint }: CaseStripProps) {
  const { value } = open;
  const undo = useWorkbench((state) => state.undo);
  const redo = useWorkbench((state) => state.redo);
  const closeCase = useWorkbench((state) => state.closeCase);
  const { patient } = value;
  const person = [
    patient.sex === "female" ? "woman" : patient.sex === "male" ? "man" : null,
    patient.age ? `${numberPrint(patient.age.value, {})} years` : null,
    patient.height ? quantityPrint(patient.height, { style: "screen", microgram: "microgram" }) : null,
  ].filter((part) => part !== null);
  const weight = analysis?.patient.weight;
  const kidney = analysis?.patient.creatinineClearance;
  const { window } = value;
  const productIds = [
    ...new Set([...value.given, ...value.options.flatMap((option) => option.lines)].map((line) => line.product)),
  ];
  const products = productIds.map((id) => productOf(value.medicine, id).name);
  return (
    <header className="strip">
      <button type="button" className="strip-brand" onClick={() => void closeCase()} title={benchWords.cases}>
        <svg viewBox="0 0 28 20" aria-hidden="true" focusable="false">
          <path d="M1.5 14.5c4 0 4.5-11 8.5-11s4.5 9 8.5 9 4-6.5 8-6.5" />
          <path className="strip-shore" d="M1.5 18.8h25" />
        </svg>
        <span>
          Ebbline<span className="strip-brand-place">all cases</span>
        </span>
      </button>
      <StripCell name="case" onPress={() => onPanel("case")} isWide>
        <strong className="strip-label">{value.label || "untitled case"}</strong>
        <span className="strip-small">
          {person.length > 0 ? person.join(", ") : "patient not entered"}
          {value.demo ? <em className="strip-demo"> · {benchWords.demoShort}</em> : null}
        </span>
      </StripCell>
      <StripCell name="weight" onPress={() => onPanel("patient")}>
        {weight ? (
          <span className="strip-nowrap">{numberPrint(weight.value, { significant: 4 })} kg</span>
        ) : (
          <Missing />
        )}
      </StripCell>
      <StripCell name="kidney function" onPress={() => onPanel("patient")}>
        {kidney ? (
          <span className="strip-nowrap">{numberPrint(kidney.value, { significant: 3 })} mL/min</span>
        ) : (
          <Missing />
        )}
      </StripCell>
      <StripCell name="medicine" onPress={() => onPanel("medicine")}>
        <span>{value.medicine.name}</span>
        {products.length > 0 ? <span className="strip-small">{products.join(", ")}</span> : null}
      </StripCell>
      <StripCell name="target window" onPress={() => onPanel("window")}>
        {window ? (
          <>
            <span className="strip-nowrap">{windowRangeWords(window, concentrationUnit(value.medicine))}</span>
            <span className="strip-small">{windowAboutWords(window)}</span>
          </>
        ) : (
          <Missing />
        )}
      </StripCell>
      <div className="strip-end">
        <SavingWords open={open} />
        <Button
          kind="quiet"
          onPress={undo}
          isDisabled={open.undo.length === 0 || open.role === "reader"}
          name={open.undo.length > 0 ? `Undo: ${editLabel(open.undo.at(-1)!.name)}` : benchWords.undo}
        >
          {benchWords.undo}
        </Button>
        <Button
          kind="quiet"
          onPress={redo}
          isDisabled={open.redo.length === 0 || open.role === "reader"}
          name={open.redo.length > 0 ? `Redo: ${editLabel(open.redo.at(-1)!.name)}` : benchWords.redo}
        >
          {benchWords.redo}
        </Button>
        <Button kind="main" onPress={onPrint}>
          {benchWords.print}
        </Button>
      </div>
    </header>
  );
}

function Missing() {
  return <span className="strip-missing">enter</span>;
}

interface StripCellProps {
  readonly name: string;
  readonly onPress: () => void;
  readonly children: ReactNode;
  readonly isWide?: boolean;
}

function StripCell({ name, onPress, children, isWide = false }: StripCellProps) {
  return (
    <button type="button" className={`strip-cell${isWide ? " strip-cell-wide" : ""}`} onClick={onPress}>
      <span className={isWide ? "visually-hidden" : "strip-small strip-nowrap"}>{name}</span>
      <span className="strip-value">{children}</span>
    </button>
  );
}

/** Whether the case is on disk, as it is and not as it is hoped. */
function SavingWords({ open }: { readonly open: OpenCase }) {
  const { saving } = open;
  const at = saving.savedAt === null ? "" : ` ${instantText(saving.savedAt, open.value.timeZone, "clock")}`;
  const words = `${benchWords.savedStates[saving.status]}${saving.status === "saved" ? at : ""}`;
  return (
    <span
      className={`strip-saving strip-saving-${saving.status}`}
      role="status"
      data-saving={saving.status}
      data-revision={open.revision}
    >
      {words}
    </span>
  );
}
