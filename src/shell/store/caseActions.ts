import { type Case, caseNew, caseParse, caseValidate } from "../../core/case/index.ts";
import { issueMessage } from "../../core/messages/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import { caseFile } from "./caseFile.ts";
import { createSession, type Session, type SessionStart } from "./createSession.ts";
import type { CaseEntry } from "./ports.ts";
import { failureIssue } from "./storageSentences.ts";
import type { StoreContext } from "./storeContext.ts";
import type { WorkbenchState } from "./workbenchState.ts";

type Offered =
  | "newCase"
  | "openCase"
  | "openDemo"
  | "closeCase"
  | "removeCase"
  | "importFile"
  | "exportFile"
  | "exportStored";

export interface CaseActions extends Pick<WorkbenchState, Offered> {
  /** Another tab saved the case: a reader shows its latest state. */
  readAgain(id: string): Promise<void>;
  /** The list as it is stored now. */
  refresh(): Promise<void>;
}

/** Opening, closing, bringing in and handing out cases. */
export function caseActions(context: StoreContext): CaseActions {
  const { repository, get, set, say } = context;

  const listed = (id: string): CaseEntry | undefined => get().entries.find((entry) => entry.id === id);
  /** Not listed: the moment it was read is the latest it can have been. */
  const savedAt = (id: string): number => listed(id)?.savedAt ?? context.clock();

  function noteSaved(value: Case, savedAt: number): void {
    const entry = {
      id: value.id,
      label: value.label,
      medicine: value.medicine.name,
      demo: value.demo === true,
      savedAt,
    };
    set({ entries: [entry, ...get().entries.filter(({ id }) => id !== value.id)] });
  }

  /** Why nothing can be made or opened now; null when it can. In memory alone is allowed when the browser gives no storage at all. */
  function notWorking(mayRead: boolean): Issue | null {
    const { boot } = get();
    if (context.ended) return context.ended;
    if (boot.kind === "ready" || boot.kind === "unavailable" || (mayRead && boot.kind === "newer" && boot.readable))
      return null;
    return boot.kind === "newer" ? issue("storage-newer", { readable: boot.readable }) : issue("storage-not-open");
  }

  /** False when the open case has changes that would be lost. */
  async function leave(): Promise<boolean> {
    const { session } = context;
    if (!session) return true;
    session.cancelPreview();
    await session.settle();
    if (!session.isSafeToLeave()) {
      say("stop", issue("leave-unsaved", { label: get().open?.value.label, id: session.id }));
      return false;
    }
    session.stop();
    context.session = null;
    set({ open: null });
    await repository.release(session.id);
    return true;
  }

  function enter(start: Omit<SessionStart, "readerReason" | "onSaved">): void {
    const readerReason = get().boot.kind === "newer" ? "newer" : "other-tab";
    context.session = createSession(context, { ...start, readerReason, onSaved: noteSaved });
    set({ screen: "bench" });
  }

  const claim = (id: string) => repository.claim(id, () => void context.inTurn(() => becomeWriter(id)));

  /** A case that is not stored yet: opened first, so that it is there to be worked on even if it can't be stored. */
  const enterNew = (make: () => Case | null): Promise<void> =>
    context.inTurn(async () => {
      const hindrance = notWorking(false);
      if (hindrance) return say("stop", hindrance);
      const value = make();
      if (!value || !(await leave())) return;
      await claim(value.id);
      enter({ value, role: "writer", savedAt: null });
      await context.session?.settle();
    });

  /** The other tab has let go: what it wrote last is read before anything can be changed here. */
  async function becomeWriter(id: string): Promise<void> {
    await refresh();
    const value = await loadOpen(id);
    if (!value) return;
    context.session?.replace(value, "writer", savedAt(id));
    say("note", issue("case-writer-now"));
  }

  /** The open case as it is stored now; closed with the reason when it can't be read. */
  async function loadOpen(id: string): Promise<Case | null> {
    if (context.ended || context.session?.id !== id) return null;
    const loaded = await repository.load(id);
    if (loaded.ok) return loaded.value;
    say("stop", ...loaded.issues);
    await drop(context.session);
    return null;
  }

  /** Closes without asking: nothing of it is to be kept. */
  async function drop(session: Session): Promise<void> {
    session.stop();
    context.session = null;
    set({ open: null, screen: "cases" });
    await session.settle(); // a write under way must not come after what follows
    await repository.release(session.id);
  }

  async function refresh(): Promise<void> {
    try {
      set({ entries: await repository.list() });
    } catch (error) {
      say("stop", issue("storage-read-failed", { detail: String(error) }));
    }
  }

  function good(result: Result<Case>): Case | null {
    if (result.ok) return result.value;
    say("stop", ...result.issues);
    return null;
  }

  return {
    newCase: ({ label, medicine, timeZone, now }) =>
      enterNew(() => {
        const record = get().medicines.find(({ id }) => id === medicine);
        if (!record) throw new RangeError(`newCase: no medicine record "${medicine}"`);
        return good(caseValidate(caseNew({ id: context.newId(), label, timeZone, now, medicine: record })));
      }),

    openDemo: (name) =>
      enterNew(() => {
        if (!Object.hasOwn(context.demos, name)) throw new RangeError(`openDemo: no demonstration "${name}"`);
        const value = good(caseValidate(context.demos[name]));
        return value && { ...value, id: context.newId(), demo: true };
      }),

    openCase: (id) =>
      context.inTurn(async () => {
        const hindrance = notWorking(true);
        if (hindrance) return say("stop", hindrance);
        if (context.session?.id === id) return set({ screen: "bench" });
        if (!(await leave())) return;
        // Claimed before it is read: what a writer reads, nobody else can change afterwards.
        const role = get().boot.kind === "newer" ? "reader" : await claim(id);
        const loaded = await repository.load(id);
        if (loaded.ok) enter({ value: loaded.value, role, savedAt: savedAt(id) });
        else {
          await repository.release(id);
          say("stop", ...loaded.issues);
        }
      }),

    closeCase: () =>
      context.inTurn(async () => {
        if (await leave()) set({ screen: "cases" });
      }),

    removeCase: (id) =>
      context.inTurn(async () => {
        if (context.session?.id === id) await drop(context.session);
        const outcome = await repository.remove(id);
        if (outcome.ok) return set({ entries: get().entries.filter((entry) => entry.id !== id) });
        const isElsewhere = outcome.reason === "read-only";
        say("stop", isElsewhere ? issue("remove-other-tab", { id, label: listed(id)?.label }) : failureIssue(outcome));
      }),

    importFile: (_name, text) =>
      context.inTurn(async (): Promise<Result<Case>> => {
        const hindrance = notWorking(false);
        if (hindrance) return fail(hindrance);
        const parsed = caseParse(text);
        if (!parsed.ok) return parsed;
        await refresh(); // another tab may have stored it meanwhile
        const isKnown = listed(parsed.value.id) !== undefined || context.session?.id === parsed.value.id;
        const value = isKnown ? { ...parsed.value, id: context.newId() } : parsed.value;
        if (get().boot.kind === "unavailable") {
          if (!(await leave())) return fail(issue("storage-not-open"));
          enter({ value, role: "writer", savedAt: null });
          return succeed(value);
        }
        const outcome = await repository.save(value);
        if (!outcome.ok) return fail(issue("import-not-stored", { reason: issueMessage(failureIssue(outcome)) }));
        noteSaved(value, outcome.savedAt);
        if (isKnown) say("note", issue("import-beside", { label: value.label, id: value.id }));
        return succeed(value);
      }),

    exportFile() {
      const { open } = get();
      if (!open) return null;
      context.session?.noteExport();
      return caseFile(open.value);
    },

    async exportStored(id) {
      const { open } = get();
      if (open?.value.id === id) {
        context.session?.noteExport();
        return succeed(caseFile(open.value));
      }
      const loaded = await repository.load(id);
      return loaded.ok ? succeed(caseFile(loaded.value)) : loaded;
    },

    readAgain: (id) =>
      context.inTurn(async () => {
        if (get().open?.role !== "reader") return;
        const value = await loadOpen(id);
        if (value) context.session?.replace(value, "reader", savedAt(id));
      }),
    refresh,
  };
}
