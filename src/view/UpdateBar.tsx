import "./NoticeStack.css";
import { Button } from "./ui/Button.tsx";
import { useWorkbench } from "./useWorkbench.ts";

/** A new version waits and asks: it is never taken under an open case without consent. */
export function UpdateBar() {
  const update = useWorkbench((state) => state.update);
  const applyUpdate = useWorkbench((state) => state.applyUpdate);
  if (update === "none") return null;
  return (
    <div className="update-bar" role="status">
      <span>A new version of Ebbline is ready. Everything is saved first; figures may change with it.</span>
      <Button kind="main" onPress={() => void applyUpdate()}>
        Take the new version
      </Button>
    </div>
  );
}
