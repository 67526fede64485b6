import type { Workbench } from "../shell/store/createWorkbench.ts";
import type { Screen } from "../shell/store/workbenchState.ts";

/** Where one is, in the address: a reload or the back button leads there again. Only a case's id stands in it, never its words. */
interface Place {
  readonly screen: Screen;
  readonly caseId: string | null;
}

const SCREENS: readonly Screen[] = ["cases", "bench", "summary", "medicines", "settings"];

export function placeText({ screen, caseId }: Place): string {
  if (screen === "cases") return "";
  return caseId !== null && (screen === "bench" || screen === "summary") ? `#${screen}/${caseId}` : `#${screen}`;
}

export function placeRead(hash: string): Place {
  const [name = "", id] = hash.replace(/^#/, "").split("/");
  const screen = SCREENS.find((each) => each === name) ?? "cases";
  const needsCase = screen === "bench" || screen === "summary";
  if (!needsCase) return { screen, caseId: null };
  // An id as this program makes them; anything else in the address leads to the list.
  return id && /^[\w-]+$/.test(id) ? { screen, caseId: id } : { screen: "cases", caseId: null };
}

/** Keeps address and screen in step. Call once the store has started. */
export function rememberPlace(workbench: Workbench): void {
  const now = (): Place => {
    const { screen, open } = workbench.getState();
    return { screen, caseId: open?.value.id ?? null };
  };
  const go = async (place: Place) => {
    const { show, openCase, closeCase, open, entries } = workbench.getState();
    if (place.caseId === null) {
      if (place.screen === "cases" && open) await closeCase();
      show(place.screen);
      return;
    }
    if (open?.value.id !== place.caseId) {
      if (!entries.some((entry) => entry.id === place.caseId)) return;
      await openCase(place.caseId);
    }
    show(place.screen);
  };
  const write = () => {
    const text = placeText(now());
    if (text !== location.hash) history.pushState(null, "", text === "" ? location.pathname : text);
  };
  addEventListener("popstate", () => void go(placeRead(location.hash)));
  // Who has gone elsewhere while the store was still opening is not fetched back.
  const isMoved = placeText(now()) !== "";
  void (isMoved ? Promise.resolve() : go(placeRead(location.hash))).finally(() => {
    write();
    workbench.subscribe((state, before) => {
      if (state.screen !== before.screen || state.open?.value.id !== before.open?.value.id) write();
    });
  });
}
