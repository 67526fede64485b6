import type { FormEvent, ReactNode } from "react";
import type { TargetWindow } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import { type FieldAsk, fieldQuestion } from "./fieldQuestion.ts";
import { WindowFields } from "./WindowFields.tsx";
import { type WindowDraft, windowAsk, windowDraftRead, windowUnitsFor } from "./windowDraft.ts";

/** A window being typed, as far as it has come. */
export interface WindowTyped {
  /** null: none is being typed. */
  readonly draft: WindowDraft | null;
  readonly isSent: boolean;
  readonly asked: FieldAsk<WindowDraft> | null;
}

export const NO_WINDOW_TYPED: WindowTyped = { draft: null, isSent: false, asked: null };

export interface WindowFormProps {
  readonly typed: WindowTyped;
  readonly onTyped: (typed: WindowTyped) => void;
  readonly record: MedicineRecord;
  readonly className: string;
  /** A window that was asked about and confirmed before: not asked about again. */
  readonly isAnswered?: (window: TargetWindow) => boolean;
  readonly onWindow: (window: TargetWindow) => void;
  /** The buttons, one of which submits. */
  readonly children: ReactNode;
}

/** A window is typed, asked about where it is odd, and handed on once it reads well. */
export function WindowForm({ typed, onTyped, record, className, isAnswered, onWindow, children }: WindowFormProps) {
  const { draft, isSent, asked } = typed;
  if (!draft) return null;
  const take = (taken: WindowDraft, isConfirmed: boolean) => {
    const read = windowDraftRead(taken);
    if (!read.ok) return;
    onTyped({ draft: taken, isSent: true, asked: null });
    onWindow({ ...read.value, ...(isConfirmed ? { confirmed: true as const } : {}) });
  };
  const send = (event: FormEvent) => {
    event.preventDefault();
    const read = windowDraftRead(draft);
    if (read.ok && isAnswered?.(read.value)) return take(draft, true);
    const ask = read.ok ? windowAsk(draft, record) : null;
    if (read.ok && !ask) take(draft, false);
    else onTyped({ draft, isSent: true, asked: ask ?? asked });
  };
  return (
    <form className={className} onSubmit={send} noValidate>
      <WindowFields
        draft={draft}
        onChange={(next) => onTyped({ ...typed, draft: next, asked: null })}
        molarMass={record.molarMass.value}
        isTold={isSent}
        units={windowUnitsFor(draft, record)}
        question={fieldQuestion(asked, take)}
      />
      {children}
    </form>
  );
}
