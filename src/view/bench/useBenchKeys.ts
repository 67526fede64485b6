import { useEffect } from "react";
import { useWorkbench } from "../useWorkbench.ts";

/** Undo and redo with one key: Ctrl or Cmd with Z; Shift or Y for redo. Left to the field while text is being typed. */
export function useBenchKeys(): void {
  const undo = useWorkbench((state) => state.undo);
  const redo = useWorkbench((state) => state.redo);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      const target = event.target;
      if (target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement) return;
      const key = event.key.toLowerCase();
      if (key === "z" && !event.shiftKey) undo();
      else if (key === "y" || (key === "z" && event.shiftKey)) redo();
      else return;
      event.preventDefault();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, [undo, redo]);
}
