import { type MedicineRecord, medicineParse } from "../../core/medicine/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import type { SaveOutcome } from "./ports.ts";
import { SETTINGS_KEY, settingsRead } from "./settings.ts";
import { failureIssue } from "./storageSentences.ts";
import type { StoreContext } from "./storeContext.ts";
import type { WorkbenchState } from "./workbenchState.ts";

type Offered = "importMedicine" | "removeMedicine" | "saveWindow" | "removeWindow" | "changeSettings";

export interface WardActions extends Pick<WorkbenchState, Offered> {
  /** Reads all of it from the storage. */
  readWard(): Promise<void>;
}

/** What the ward keeps beside its cases: settings, its own medicine records, its own target windows. */
export function wardActions(context: StoreContext): WardActions {
  const { repository, builtInRecords, get, set, say } = context;
  const isBuiltIn = (id: string): boolean => builtInRecords.some((record) => record.id === id);
  const done = (outcome: SaveOutcome): Result<null> => (outcome.ok ? succeed(null) : fail(failureIssue(outcome)));

  function putOwn(own: readonly MedicineRecord[]): void {
    const shown = own.filter(({ id }) => !isBuiltIn(id)).sort((a, b) => (a.name < b.name ? -1 : 1));
    set({ medicines: [...builtInRecords, ...shown], ownMedicines: shown.map(({ id }) => id) });
  }
  const own = (): readonly MedicineRecord[] => get().medicines.filter(({ id }) => !isBuiltIn(id));

  return {
    async readWard() {
      const records = await repository.listMedicines();
      putOwn(records);
      const hidden = records.filter(({ id }) => isBuiltIn(id)).map(({ id }): Issue => issue("medicine-hidden", { id }));
      if (hidden.length > 0) say("check", ...hidden);
      set({
        wardWindows: await repository.listWindows(),
        settings: settingsRead(await repository.readSetting(SETTINGS_KEY)),
      });
    },

    async importMedicine(name, text) {
      let json: unknown;
      try {
        json = JSON.parse(text);
      } catch {
        return fail(issue("medicine-file-unreadable", { name }));
      }
      const parsed = medicineParse(json);
      if (!parsed.ok) return parsed;
      const { id } = parsed.value;
      if (isBuiltIn(id)) return fail(issue("medicine-built-in", { id }, ["id"]));
      const outcome = await repository.saveMedicine(parsed.value);
      if (!outcome.ok) return fail(failureIssue(outcome));
      putOwn([...own().filter((record) => record.id !== id), parsed.value]);
      return parsed;
    },

    async removeMedicine(id) {
      if (isBuiltIn(id)) throw new RangeError(`removeMedicine: "${id}" comes with the program`);
      const outcome = await repository.removeMedicine(id);
      if (outcome.ok) putOwn(own().filter((record) => record.id !== id));
      return done(outcome);
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
