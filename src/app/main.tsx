import "../shell/workers/zodJitless.ts";

import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { issue } from "../core/result/index.ts";
import { registerServiceWorker } from "../shell/offline/registerServiceWorker.ts";
import type { Workbench as Store } from "../shell/store/createWorkbench.ts";
import { WorkbenchProvider } from "../view/useWorkbench.ts";
import { Workbench } from "../view/Workbench.tsx";
import { compose } from "./compose.ts";
import { ErrorBoundary, Stopped } from "./ErrorBoundary.tsx";
import { keepWork } from "./keepWork.ts";
import { rememberPlace } from "./rememberPlace.ts";

const root = createRoot(document.querySelector("#root")!);

function start(): void {
  let store: Store;
  try {
    store = compose();
  } catch (error) {
    root.render(<Stopped error={error} workbench={null} />);
    return;
  }
  root.render(
    <StrictMode>
      <ErrorBoundary workbench={store}>
        <WorkbenchProvider store={store}>
          <Workbench />
        </WorkbenchProvider>
      </ErrorBoundary>
    </StrictMode>,
  );
  keepWork(store);
  void store
    .getState()
    .start()
    .then(() => rememberPlace(store));
  registerServiceWorker({
    onWaiting: (apply) => store.getState().offerUpdate(apply),
    onFailed: (detail) => store.getState().notify("check", [issue("offline-not-ready", { detail })]),
  });
}

start();
