import { fieldWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";

/** Every change counts at once; this only closes the panel. */
export function PanelDone({ onDone }: { readonly onDone: () => void }) {
  return (
    <div className="entry-panel-done">
      <Button onPress={onDone}>{fieldWords.done}</Button>
    </div>
  );
}
