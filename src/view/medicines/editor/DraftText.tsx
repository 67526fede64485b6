import { type DraftPath, draftTyped } from "../../../core/medicine/index.ts";
import { TextField } from "../../ui/TextField.tsx";
import { placeOf, useDraft } from "./draftContext.ts";

export interface DraftTextProps {
  readonly path: DraftPath;
  readonly label: string;
  readonly description?: string;
  readonly isMultiline?: boolean;
  readonly maxLength?: number;
}

/** Words of the record, or a number, exactly as typed. */
export function DraftText({ path, label, description, isMultiline = false, maxLength }: DraftTextProps) {
  const { nodeAt, change, faultAt } = useDraft();
  return (
    <div data-place={placeOf(path)}>
      <TextField
        label={label}
        value={draftTyped(nodeAt(path))}
        onChange={(text) => change(path, text)}
        description={description}
        fault={faultAt(path)}
        isMultiline={isMultiline}
        {...(maxLength === undefined ? {} : { maxLength })}
      />
    </div>
  );
}
