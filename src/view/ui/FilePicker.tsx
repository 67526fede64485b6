import { FileTrigger } from "react-aria-components";
import { Button } from "./Button.tsx";

export interface FilePickerProps {
  readonly word: string;
  /** File name endings, for example ".json". */
  readonly endings: readonly string[];
  readonly onFile: (file: File) => void;
  readonly kind?: "main" | "plain" | "quiet";
  readonly isDisabled?: boolean;
}

export function FilePicker({ word, endings, onFile, kind = "plain", isDisabled = false }: FilePickerProps) {
  return (
    <FileTrigger
      acceptedFileTypes={[...endings]}
      onSelect={(files) => {
        const file = files?.[0];
        if (file) onFile(file);
      }}
    >
      <Button kind={kind} isDisabled={isDisabled}>
        {word}
      </Button>
    </FileTrigger>
  );
}
