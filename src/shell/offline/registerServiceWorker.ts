export interface ServiceWorkerNews {
  /** A new version is ready and waits. `apply` takes it and reloads the page: call it only when the user agreed and all is saved. */
  readonly onWaiting: (apply: () => void) => void;
  /** The whole program is stored on this machine: from now on it opens without a network. */
  readonly onReady?: () => void;
  /** The program could not be stored on this machine; it works only while its server answers. */
  readonly onFailed?: (detail: string) => void;
}

const ONE_HOUR_MS = 3_600_000;

/** Stores the program for offline use and watches for a new version: at once, when the window gets the focus, and hourly. */
export function registerServiceWorker(news: ServiceWorkerNews): void {
  // `vite dev` has no built worker; a cached program there would only hide the change just made.
  if (import.meta.env.DEV) return;
  if (!("serviceWorker" in navigator)) {
    news.onFailed?.("this browser has no service workers, or the page came neither by https nor from this machine");
    return;
  }
  void watch(navigator.serviceWorker, news);
}

async function watch(container: ServiceWorkerContainer, news: ServiceWorkerNews): Promise<void> {
  // On the very first visit the worker claims the page, which also counts as a change of controller: nothing to reload then.
  let hadController = container.controller !== null;
  let consented = false;

  container.addEventListener("controllerchange", () => {
    if (consented) location.reload();
    // Another tab agreed to the new version. This one may hold unsaved work, so it asks as well.
    else if (hadController) news.onWaiting(() => location.reload());
    hadController = true;
  });

  let registration: ServiceWorkerRegistration;
  try {
    registration = await container.register(new URL("serviceWorker.js", document.baseURI), { updateViaCache: "none" });
  } catch (fault) {
    news.onFailed?.(String(fault));
    return;
  }

  const offer = () =>
    news.onWaiting(() => {
      // The newest that waits, if another came since the offer; none waits if another tab has taken it already.
      if (!registration.waiting) return location.reload();
      consented = true;
      registration.waiting.postMessage("take-over");
    });
  const follow = (worker: ServiceWorker | null) => {
    worker?.addEventListener("statechange", () => {
      if (worker.state === "installed" && registration.active) offer();
      if (worker.state === "redundant" && !registration.active)
        news.onFailed?.("the program's files could not be stored");
    });
  };

  if (registration.waiting && registration.active) offer();
  follow(registration.installing);
  registration.addEventListener("updatefound", () => follow(registration.installing));
  void container.ready.then(({ active }) => {
    // A page that was loading in the very moment the worker became active was missed by it, as is one reloaded past the cache.
    if (container.controller === null) active?.postMessage("claim");
    news.onReady?.();
  });

  // Offline, the check fails: that is the normal case here and no news.
  const check = () => void registration.update().catch(() => undefined);
  window.addEventListener("focus", check);
  document.addEventListener("visibilitychange", () => {
    if (document.visibilityState === "visible") check();
  });
  setInterval(check, ONE_HOUR_MS);
}
