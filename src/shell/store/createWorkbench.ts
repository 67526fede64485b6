import { createStore, type StoreApi } from "zustand/vanilla";
import { caseHeadRead } from "../../core/case/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import { bootActions } from "./bootActions.ts";
import { caseActions } from "./caseActions.ts";
import type { Session } from "./createSession.ts";
import { settingsRead } from "./settings.ts";
import type { StoreContext, WorkbenchSetting } from "./storeContext.ts";
import { wardActions } from "./wardActions.ts";
import type { DemoEntry, WorkbenchState } from "./workbenchState.ts";

export type Workbench = StoreApi<WorkbenchState>;

/** The state of the workbench and everything that can be done to it. */
export function createWorkbench(setting: WorkbenchSetting): Workbench {
  return createStore<WorkbenchState>()((set, get) => {
    let notices = 0;
    let turn: Promise<unknown> = Promise.resolve();
    let takeUpdate: (() => void) | null = null;

    const context: StoreContext = {
      ...setting,
      get,
      set,
      session: null,
      ended: null,
      say(gravity, ...issues) {
        const isSaid = get().notices.some(
          (each) => each.gravity === gravity && JSON.stringify(each.issues) === JSON.stringify(issues),
        );
        if (isSaid) return;
        notices += 1;
        set({ notices: [...get().notices, { id: notices, gravity, issues }] });
      },
      offer(gravity, issues, undo) {
        notices += 1;
        set({ notices: [...get().notices, { id: notices, gravity, issues, undo }] });
      },
      inTurn(work) {
        const result = turn.then(work);
        turn = result.catch(() => {});
        return result;
      },
    };
    const cases = caseActions(context);
    const ward = wardActions(context);
    const boot = bootActions(context, cases, ward);
    const withOpen = (work: (session: Session) => void): void => {
      if (context.session) work(context.session);
      else context.say("check", issue("edit-no-case"));
    };

    const demos = demosRead(setting.demos);

    return {
      boot: { kind: "opening" },
      screen: "cases",
      entries: [],
      medicines: setting.builtInRecords,
      ownMedicines: [],
      recordEdits: {},
      wardWindows: [],
      demos: demos.good,
      settings: settingsRead(undefined),
      open: null,
      notices: demos.faults.map((fault) => ({ id: ++notices, gravity: "stop", issues: [fault] })),
      update: "none",

      start: boot.start,
      acceptLoss: boot.acceptLoss,
      show: (screen) => set({ screen }),
      newCase: cases.newCase,
      openCase: cases.openCase,
      openDemo: cases.openDemo,
      closeCase: cases.closeCase,
      removeCase: cases.removeCase,
      importFile: cases.importFile,
      exportFile: cases.exportFile,
      exportStored: cases.exportStored,
      importMedicine: ward.importMedicine,
      exportMedicine: ward.exportMedicine,
      copyMedicine: ward.copyMedicine,
      startRecordEdit: ward.startRecordEdit,
      keepRecordEdit: ward.keepRecordEdit,
      saveRecordEdit: ward.saveRecordEdit,
      removeMedicine: ward.removeMedicine,
      saveWindow: ward.saveWindow,
      removeWindow: ward.removeWindow,
      changeSettings: ward.changeSettings,

      edit: (name, args, nudged) => withOpen((session) => session.edit(name, args, nudged)),
      previewEdit: (name, args) => withOpen((session) => session.previewEdit(name, args)),
      cancelPreview: () => context.session?.cancelPreview(),
      undo: () => context.session?.undo(),
      redo: () => context.session?.redo(),

      notify: (gravity, issues) => context.say(gravity, ...issues),
      dismiss: (id) => set({ notices: get().notices.filter((each) => each.id !== id) }),
      async undoNotice(id) {
        const undo = get().notices.find((each) => each.id === id)?.undo;
        // Taken off first: pressed twice, it is done once.
        set({ notices: get().notices.filter((each) => each.id !== id) });
        await undo?.();
      },
      offerUpdate(apply) {
        takeUpdate = apply;
        set({ update: "waiting" });
      },
      applyUpdate: () =>
        context.inTurn(async () => {
          await context.session?.settle();
          if (context.session && !context.session.isSafeToLeave())
            return context.say(
              "stop",
              issue("update-unsaved", { label: get().open?.value.label, id: context.session.id }),
            );
          takeUpdate?.();
        }),
      settle: async () => context.session?.settle(),
    };
  });
}

/**
 * What the list shows of each demonstration; one without it is not offered, and named. Whether the whole is a good case is asked when it is
 * opened: asking it of all of them is a good part of the time the program takes to start.
 */
function demosRead(demos: Readonly<Record<string, unknown>>): { good: DemoEntry[]; faults: Issue[] } {
  const good: DemoEntry[] = [];
  const faults: Issue[] = [];
  for (const [name, value] of Object.entries(demos)) {
    const head = caseHeadRead(value);
    if (!head) faults.push(issue("demo-unreadable", { name }));
    else {
      const { label, medicine, notes } = head;
      // What the case says of itself: the first line of its notes.
      good.push({ name, label, medicine, about: notes.split("\n", 1)[0]?.trim() ?? "" });
    }
  }
  return { good, faults };
}
