import type { Workbench } from "../shell/store/createWorkbench.ts";

/** What the page does so that no work is lost with it: writes when it is put away, asks before it is closed too early, asks the browser to keep the storage. */
export function keepWork(workbench: Workbench): void {
  const flush = () => void workbench.getState().settle();
  document.addEventListener("visibilitychange", () => {
    if (document.visibilityState === "hidden") flush();
  });
  window.addEventListener("pagehide", flush);

  window.addEventListener("beforeunload", (event) => {
    const status = workbench.getState().open?.saving.status;
    if (status === "unsaved" || status === "saving" || status === "failed") event.preventDefault();
  });

  // Asked once there is something to keep; a browser may say no, and nothing here relies on it.
  const stop = workbench.subscribe(({ open }) => {
    if (open?.saving.status !== "saved" || open.value.demo) return;
    stop();
    void navigator.storage?.persist?.().catch(() => false);
  });
}
