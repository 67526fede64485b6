/** What was typed can be meant, but is odd: asked about, never changed silently. */
export interface FieldQuestion {
  readonly text: string;
  readonly answers: readonly { readonly label: string; readonly onAnswer: () => void }[];
}

/** An odd value, asked about: every answer is a value to take; `isConfirmed` when it is the one that was typed. */
export interface FieldAsk<T> {
  readonly text: string;
  readonly answers: readonly { readonly label: string; readonly value: T; readonly isConfirmed: boolean }[];
}

/** The ask as a field shows it; `onTake` is told the answer. */
export function fieldQuestion<T>(
  asked: FieldAsk<T> | null | undefined,
  onTake: (value: T, isConfirmed: boolean) => void,
): FieldQuestion | undefined {
  if (!asked) return undefined;
  return {
    text: asked.text,
    answers: asked.answers.map(({ label, value, isConfirmed }) => ({
      label,
      onAnswer: () => onTake(value, isConfirmed),
    })),
  };
}
