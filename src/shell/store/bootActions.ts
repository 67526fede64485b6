import { type Issue, issue } from "../../core/result/index.ts";
import type { CaseActions } from "./caseActions.ts";
import type { StorageChange, StorageState } from "./ports.ts";
import type { StoreContext } from "./storeContext.ts";
import type { WardActions } from "./wardActions.ts";
import type { WorkbenchState } from "./workbenchState.ts";

type BootActions = Pick<WorkbenchState, "start" | "acceptLoss">;

/** Opening the storage, and what it says of itself later. */
export function bootActions(context: StoreContext, cases: CaseActions, ward: WardActions): BootActions {
  const { repository, set, say } = context;
  let isListening = false;

  async function start(): Promise<void> {
    if (!isListening) repository.subscribe((change) => void heed(change));
    isListening = true;
    const state = await openSafely();
    set({ boot: state });
    if (state.kind !== "ready" && !(state.kind === "newer" && state.readable)) return;
    await cases.refresh();
    try {
      await ward.readWard();
    } catch (error) {
      say("stop", issue("storage-read-failed", { detail: String(error) }));
    }
  }

  async function openSafely(): Promise<StorageState> {
    try {
      return await repository.open();
    } catch (error) {
      return { kind: "unavailable", detail: String(error) };
    }
  }

  async function heed(change: StorageChange): Promise<void> {
    switch (change.kind) {
      case "saved":
      case "removed":
        await cases.refresh();
        return cases.readAgain(change.id);
      case "superseded":
        return end(issue("storage-superseded"));
      case "gone":
        context.session?.saveAgain();
        return cases.refresh();
      case "unblocked":
        return start();
      case "fault":
        return say("note", ...change.issues);
    }
  }

  function end(reason: Issue): void {
    context.ended = reason;
    context.session?.freeze();
    say("stop", reason);
  }

  return {
    start,
    async acceptLoss() {
      try {
        await repository.acceptLoss();
      } catch (error) {
        say("stop", issue("storage-read-failed", { detail: String(error) }));
      }
      await start();
    },
  };
}
