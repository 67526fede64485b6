import { createContext, createElement, type ReactNode, useContext } from "react";
import { useStore } from "zustand";
import type { Workbench } from "../shell/store/createWorkbench.ts";
import type { WorkbenchState } from "../shell/store/workbenchState.ts";

const WorkbenchContext = createContext<Workbench | null>(null);

/** Hands the store to the screens below. */
export function WorkbenchProvider({ store, children }: { readonly store: Workbench; readonly children: ReactNode }) {
  return createElement(WorkbenchContext, { value: store }, children);
}

/**
 * The only bridge from the store to React. `select` picks one part of the state, or one action: what it returns must be the same value while nothing
 * changed, so it makes no new object or array.
 */
export function useWorkbench<T>(select: (state: WorkbenchState) => T): T {
  const store = useContext(WorkbenchContext);
  if (!store) throw new RangeError("useWorkbench: no WorkbenchProvider above this component");
  return useStore(store, select);
}
