import type { MessageFunction } from "./messageFunction.ts";

const cases = (count: unknown): string => (count === 1 ? "1 case" : `${count} cases`);
const named = ({ label, id }: Readonly<Record<string, unknown>>): string => `“${label || id}”`;
const technical = ({ detail }: Readonly<Record<string, unknown>>): string => (detail ? ` (${detail})` : "");

/** Where the work is kept: what stands in the way, and what to do. */
export const storageMessages: Readonly<Record<string, MessageFunction>> = {
  // the database as a whole
  "storage-newer": ({ readable }) =>
    readable
      ? "The stored cases were written by a newer version of Ebbline, so they can be read and exported here but not changed; reload the page to get the newer version."
      : "The stored cases were written by a newer version of Ebbline and can't be read by this one; reload the page to get the newer version.",
  "storage-superseded": () =>
    "A newer version of Ebbline has taken over the storage in another tab, so this tab can no longer save; export the case if it has unsaved changes, then reload the page.",
  "storage-restored": ({ cases: count }) =>
    `${cases(count)} put back from the second copy; check the latest changes of each against your notes.`,
  "storage-no-locks": () =>
    "This browser can't lock a case for one tab (that needs https or this computer's own address), so work on a case in one tab only; a save over another tab's work is still refused.",
  "storage-no-copies": () =>
    "This browser keeps no second copy of your cases (that needs https or this computer's own address), so export the cases that matter as files.",
  "storage-copy-failed": (data) =>
    `The case was saved, but its second copy was not${technical(data)}; export the cases that matter as files.`,
  "storage-copies-unread": (data) =>
    `The second copies of your cases could not be read${technical(data)}; reload the page before you go on, they may be readable then.`,

  "offline-not-ready": (data) =>
    `Ebbline could not be stored for use without the network${technical(data)}; it works while this address answers, and the cases are kept all the same.`,

  // saving
  "save-quota": () =>
    "The browser's storage is full: your changes are kept only while this page is open, so export the case now, then remove cases you no longer need.",
  "save-newer": () =>
    "The storage belongs to a newer version of Ebbline, so changes can't be saved here; export the case, then reload the page.",
  "save-other-tab": () =>
    "Another tab is working on this case, so it is read-only here; close it there and you can go on here.",
  "save-overtaken": () =>
    "Another tab has saved this case meanwhile, so your changes were not written over it; export the case here, then open it again.",
  "save-closed": () =>
    "The connection to the browser's storage is gone and your changes are kept only while this page is open; export the case now, then reload the page.",
  "save-failed": (data) =>
    `Saving failed${technical(data)}; it is tried again by itself, but export the case now to be safe.`,
  "storage-not-open": () =>
    "Ebbline's storage is not open, so nothing was done; settle first what is said about it on the cases screen.",

  // single cases and entries
  "storage-read-failed": (data) => `The browser's storage could not be read${technical(data)}; reload the page.`,
  "storage-case-gone": () => "This case is no longer stored: it was removed in another tab.",
  "storage-row-damaged": (data) =>
    `The stored case ${named(data)} is damaged: it is left as it is and can't be opened; import its file if you exported one.`,
  "storage-row-unreadable": (data) =>
    `The stored case ${named(data)} can't be read and is left as it is; the faults found follow.`,
  "storage-entry-unreadable": ({ table, name }) =>
    `A stored ${table === "windows" ? "target window" : "medicine record"} (${name}) can't be read and is left out.`,
  "case-writer-now": () => "The other tab has let go of this case: it was read again and you can change it here.",
  "remove-other-tab": (data) =>
    `The case ${named(data)} is open in another tab, so it was not removed; close it there first.`,

  // doing things
  "edit-read-only": () => "This case is read-only here, so the change was not made.",
  "edit-no-case": () => "No case is open, so the change was not made.",
  "leave-unsaved": (data) =>
    `The case ${named(data)} has changes that could not be saved; export it first, then you can leave it.`,
  "update-unsaved": (data) =>
    `The case ${named(data)} has changes that could not be saved; export it first, then take the new version.`,
  "import-not-stored": ({ reason }) => `The file is good, but it could not be stored: ${reason}`,
  "import-beside": (data) =>
    `A case with the same identity is already stored; ${named(data)} was imported beside it as a case of its own.`,
  "demo-unreadable": ({ name }) =>
    `The demonstration “${name}” of this version of Ebbline is faulty and can't be offered.`,
  "medicine-built-in": ({ id }) =>
    `“${id}” is the identity of a record that comes with Ebbline; give your own record another one.`,
  "medicine-hidden": ({ id }) =>
    `Your own record “${id}” is hidden by a record of the same identity that now comes with Ebbline; import it again under another one.`,
  "setting-not-saved": () => "The setting holds while this page is open, but could not be saved.",

  // the analysis
  "analysis-deadline": () =>
    "The calculation was stopped because it took too long; the figures shown are those of an earlier state.",
  "analysis-failed": (data) =>
    `The calculation failed${technical(data)}; the figures shown are those of an earlier state.`,
};
