import { type ReactNode, useId } from "react";
import { FieldSaid } from "./FieldSaid.tsx";
import type { FieldQuestion } from "./fieldQuestion.ts";
import "./FieldFrame.css";

/** What the control itself has to carry so that label, description and fault are read with it. */
export interface FieldWiring {
  readonly id: string;
  readonly "aria-describedby": string | undefined;
  readonly "aria-invalid": true | undefined;
}

export interface FieldFrameProps {
  readonly label: string;
  readonly isLabelHidden?: boolean;
  readonly description?: string | undefined;
  /** How what was typed is understood, in words. */
  readonly reading?: string | undefined;
  /** The sentence that says what can't be read. */
  readonly fault?: string | undefined;
  readonly question?: FieldQuestion | undefined;
  readonly children: (wiring: FieldWiring) => ReactNode;
}

/** Label above, control, then what is said about it. Faults and questions appear in a polite live region. */
export function FieldFrame({
  label,
  isLabelHidden = false,
  description,
  reading,
  fault,
  question,
  children,
}: FieldFrameProps) {
  const id = useId();
  const described = [
    fault || question ? `${id}-said` : null,
    reading && !fault ? `${id}-reading` : null,
    description ? `${id}-description` : null,
  ].filter((part) => part !== null);
  return (
    <div className={`field-frame${fault ? " field-frame-faulty" : ""}`}>
      <label className={isLabelHidden ? "visually-hidden" : "field-frame-label"} htmlFor={id}>
        {label}
      </label>
      {children({
        id,
        "aria-describedby": described.length > 0 ? described.join(" ") : undefined,
        "aria-invalid": fault ? true : undefined,
      })}
      {description ? (
        <p className="field-frame-description" id={`${id}-description`}>
          {description}
        </p>
      ) : null}
      {reading && !fault ? (
        <p className="field-frame-reading" id={`${id}-reading`}>
          {reading}
        </p>
      ) : null}
      <FieldSaid id={`${id}-said`} fault={fault} question={question} />
    </div>
  );
}
