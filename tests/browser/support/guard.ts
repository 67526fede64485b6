import type { BrowserContext } from "@playwright/test";

/** Collects what must never happen in any test: a request to another origin, a breach of the policy, an error in the page or its console. */
export interface Guard {
  /** Takes out the incidents a test provoked on purpose; what is left fails the test. */
  take(pattern: RegExp): string[];
  readonly incidents: readonly string[];
}

const BREACH = "policy breach:";
/** What a browser itself notes of a server that does not answer, which many a test wants. */
const UNREACHED =
  /^Failed to load resource|ERR_(INTERNET_DISCONNECTED|CONNECTION_REFUSED)|error occurred when fetching the script/;

export async function guardContext(context: BrowserContext, origin: string): Promise<Guard> {
  const incidents: string[] = [];

  context.on("request", (request) => {
    const url = new URL(request.url());
    const isOverNetwork = /^(https?|wss?):$/.test(url.protocol);
    if (isOverNetwork && url.origin !== new URL(origin).origin) incidents.push(`foreign request: ${url.href}`);
  });
  context.on("page", (page) => {
    page.on("websocket", (socket) => incidents.push(`foreign request: ${socket.url()}`));
    page.on("crash", () => incidents.push("the page crashed"));
  });
  context.on("weberror", (fault) => incidents.push(`uncaught error: ${fault.error().stack ?? fault.error().message}`));
  context.on("console", (message) => {
    const text = message.text();
    const isBreach = text.startsWith(BREACH) || text.includes("Content Security Policy");
    if (isBreach || (message.type() === "error" && !UNREACHED.test(text))) incidents.push(`console: ${text}`);
  });
  await context.addInitScript((mark) => {
    document.addEventListener("securitypolicyviolation", (event) => {
      console.error(`${mark} ${event.effectiveDirective} refused ${event.blockedURI || "inline"} ${event.sample}`);
    });
  }, BREACH);

  return {
    incidents,
    take(pattern) {
      const taken = incidents.filter((incident) => pattern.test(incident));
      incidents.splice(0, incidents.length, ...incidents.filter((incident) => !pattern.test(incident)));
      return taken;
    },
  };
}
