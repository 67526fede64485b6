import { useEffect, useState } from "react";

export type Persistence = "unknown" | "given" | "not given";

/** Whether the browser has promised not to clear this site's store, and a way to ask for it. */
export function usePersistence(): { readonly state: Persistence; readonly ask: () => Promise<void> } {
  const [state, setState] = useState<Persistence>("unknown");
  const storage = typeof navigator.storage?.persisted === "function" ? navigator.storage : null;
  useEffect(() => {
    let isHere = true;
    void storage?.persisted().then((given) => isHere && setState(given ? "given" : "not given"));
    return () => {
      isHere = false;
    };
  }, [storage]);
  const ask = async () => {
    if (storage) setState((await storage.persist()) ? "given" : "not given");
  };
  return { state, ask };
}
