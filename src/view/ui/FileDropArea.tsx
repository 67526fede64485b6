import { type DragEvent, type ReactNode, useState } from "react";
import "./FileDropArea.css";

export interface FileDropAreaProps {
  readonly children: ReactNode;
  readonly onFile: (file: File) => void;
  /** Said over the page while a file hangs over it. */
  readonly word: string;
  readonly isDisabled?: boolean;
}

/** A whole screen on which a file can be dropped. The same is always offered by a button: dropping needs a mouse. */
export function FileDropArea({ children, onFile, word, isDisabled = false }: FileDropAreaProps) {
  const [isOver, setOver] = useState(false);
  const holdsFile = (event: DragEvent) => !isDisabled && event.dataTransfer.types.includes("Files");
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: takes drops only; keyboard and screen reader use the button that does the same
    <div
      className="file-drop-area"
      onDragOver={(event) => {
        if (!holdsFile(event)) return;
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={(event) => {
        if (!event.currentTarget.contains(event.relatedTarget as Node | null)) setOver(false);
      }}
      onDrop={(event) => {
        if (!holdsFile(event)) return;
        event.preventDefault();
        setOver(false);
        const file = event.dataTransfer.files[0];
        if (file) onFile(file);
      }}
    >
      {children}
      {isOver ? (
        <p className="file-drop-area-word" aria-hidden="true">
          {word}
        </p>
      ) : null}
    </div>
  );
}
