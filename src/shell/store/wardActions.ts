import { fail, issue, type Result, succeed } from "../../core/result/index.ts";
import { type MedicineActions, medicineActions } from "./medicineActions.ts";
import type { SaveOutcome } from "./ports.ts";
import { SETTINGS_KEY, settingsRead } from "./settings.ts";
import { failureIssue } from "./storageSentences.ts";
import type { StoreContext } from "./storeContext.ts";
import type { WorkbenchState } from "./workbenchState.ts";

type Offered = "saveWindow" | "removeWindow" | "changeSettings";

export interface WardActions extends Pick<WorkbenchState, Offered>, Omit<MedicineActions, "readMedicines"> {
  /** Reads all of it from the storage. */
  readWard(): Promise<void>;
}

/** What the ward keeps beside its cases: settings, its own medicine records, its own target windows. */
export function wardActions(context: StoreContext): WardActions {
  const { repository, get, set, say } = context;
  const { readMedicines, ...medicines } = medicineActions(context);
  const done = (outcome: SaveOutcome): Result<null> => (outcome.ok ? succeed(null) : fail(failureIssue(outcome)));

  return {
    ...medicines,

    async readWard() {
      await readMedicines();
      set({
        wardWindows: await repository.listWindows(),
        settings: settingsRead(await repository.readSetting(SETTINGS_KEY)),
      });
    },

    async saveWindow(medicine, id, window) {
      const outcome = await repository.saveWindow(medicine, id, window);
      const others = get().wardWindows.filter((each) => each.medicine !== medicine || each.id !== id);
      if (outcome.ok) set({ wardWindows: [...others, { medicine, id, window }] });
      return done(outcome);
    },

    async removeWindow(medicine, id) {
      const outcome = await repository.removeWindow(medicine, id);
      if (outcome.ok)
        set({ wardWindows: get().wardWindows.filter((each) => each.medicine !== medicine || each.id !== id) });
      return done(outcome);
    },

    async changeSettings(change) {
      const settings = { ...get().settings, ...change };
      set({ settings });
      const outcome = await repository.writeSetting(SETTINGS_KEY, settings);
      if (!outcome.ok) say("check", issue("setting-not-saved"), failureIssue(outcome));
    },
  };
}
