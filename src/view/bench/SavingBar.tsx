import { benchWords } from "../../core/messages/index.ts";
import type { OpenCase } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import { fileSave } from "../ui/fileSave.ts";
import { GravityMark } from "../ui/GravityMark.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import "./SavingBar.css";

/** Why the case is not (or can't be) on disk, and the file that keeps it: shown for as long as it is so. */
export function SavingBar({ open }: { readonly open: OpenCase }) {
  const exportFile = useWorkbench((state) => state.exportFile);
  const { saving } = open;
  if (saving.status !== "failed" && saving.status !== "read-only") return null;
  const save = () => {
    const file = exportFile();
    if (file) fileSave(file.name, file.text);
  };
  return (
    <div className={`saving-bar saving-bar-${saving.status}`} role={saving.status === "failed" ? "alert" : "status"}>
      <GravityMark gravity={saving.status === "failed" ? "stop" : "note"} />
      <p>{saving.detail}</p>
      <Button kind={saving.status === "failed" ? "main" : "plain"} onPress={save}>
        {benchWords.exportFile}
      </Button>
    </div>
  );
}
