/** Fixed words of the screens: cases, medicines, settings. The same word stands for the same thing everywhere (docs/glossary.md). */

import { windowQuantityWord } from "./windowWords.ts";

export const placeWords = {
  cases: "Cases",
  bench: "Bench",
  medicines: "Medicines",
  settings: "Settings",
} as const;

export const INTENDED_USE =
  "Ebbline supports a licensed professional who settles an oral regimen. It does not replace their judgement, the current product information or local policy; where they differ, local policy goes first. Check every figure independently before it is acted on.";

export const casesWords = {
  heading: "Cases",
  about: "One case is one patient, one medicine and one question: which regimen.",
  stored: "Cases on this device",
  storedNone: "No case is stored on this device yet.",
  caseLabel: "case",
  medicine: "medicine",
  medicineLabel: "Medicine",
  savedWhen: "last saved",
  actions: "actions",
  demoMark: "demo, invented patient",
  unlabelled: "without a label",
  open: "Open",
  exportFile: "Export",
  remove: "Remove",
  newCase: "New case",
  newCaseFirst: "First step: a new case",
  label: "Label",
  labelHelp: "A place or a number your ward knows, not the patient's name: Harbour ward 3, bed 12.",
  labelMissing: "Give the case a label; it is how you find it again.",
  medicineMissing: "Choose the medicine the case is about.",
  medicinePrompt: "Choose the medicine …",
  invented: "invented, for demonstration",
  timeZone: "Time zone of the clock times",
  now: "The now line",
  nowHelp: "What was lies before it, what is proposed after it. It stays where you put it.",
  create: "Start the case",
  demos: "Or open an invented case and look around",
  demosWithCases: "Invented cases to try things on",
  demosHelp: "Each opens as a fresh copy; nothing you do to it changes the next one.",
  openDemo: "Open",
  importFile: "Import a case file",
  importHelp: "Or drop a .ebbline.json file anywhere on this page. Nothing is stored unless the whole file is good.",
  importDrop: "Drop the case file to import it",
  importedTitle: "Imported",
  imported: (label: string) => `“${label}” is stored on this device.`,
  refusedTitle: (name: string) => `“${name}” was not imported`,
  at: (path: readonly (string | number)[]) => `(at ${path.join(".")})`,
  exportFailedTitle: "Nothing was exported",
  refusedMore: (count: number) => `and ${count} more ${count === 1 ? "fault" : "faults"} in the same file.`,
  removeTitle: "Remove this case?",
  removeText: (label: string) =>
    `“${label}” goes from this device for good; undo does not bring it back. A file you exported before is not touched.`,
  keep: "Keep it",
  exportFirst: "Export it first",
  removeNow: "Remove it",
} as const;

export const bootWords = {
  opening: "Opening the cases stored on this device …",
  lostTitle: {
    all: "The cases stored on this device are gone",
    some: "Some of the cases stored on this device are gone",
  },
  lostCount: (cases: number, when: string | null) =>
    `${cases === 1 ? "One case is" : `${cases} cases are`} concerned${when ? `; the last was saved ${when}` : ""}.`,
  lostWhy: {
    all: "Work was stored here before, but the browser now shows an empty store: it was cleared, or it was damaged and the browser discarded it.",
    some: "The browser's store is the one expected, but cases are missing from it or stand at an earlier save: it was damaged, or an older copy of it came back.",
  },
  lostRecoverable: (count: number) =>
    `${count === 1 ? "One of them has" : `${count} of them have`} a second copy, which “Go on” puts back.`,
  lostWhatToDo:
    "Look for case files exported earlier (they end in .ebbline.json) and import them. What has no copy can't be brought back from here.",
  lostImport: "Import a backup file",
  lostAccept: "Go on",
  newerTitle: "A newer Ebbline wrote these cases",
  newer: (found: number, known: number, isReadable: boolean) =>
    `The store on this device has version ${found}; this copy of Ebbline knows version ${known}. ${isReadable ? "Cases can be opened, read and exported" : "Cases can't be read here"}, and nothing is changed or stored, so that nothing of the newer version is lost. Reload to get the newer program.`,
  blockedTitle: "Another tab holds the store",
  blocked:
    "An older version of Ebbline is open in another tab and keeps the store locked. Close the other tabs of Ebbline, then reload this one.",
  unavailableTitle: "Nothing can be stored in this browser",
  unavailable: (detail: string) =>
    `The browser does not let Ebbline keep anything here (${detail}). You can work, but a case lasts only as long as this tab: export it as a file before you close it.`,
  reload: "Reload",
} as const;

export const medicinesWords = {
  heading: "Medicine records",
  about:
    "A record holds a medicine's kinetics, products, windows and cautions. Every figure names its source and how it is known.",
  list: "Records",
  own: "the ward's own",
  builtIn: "built in",
  recordVersion: (version: number) => `record version ${version}`,
  notReviewed: "not independently reviewed",
  reviewed: (by: string | undefined, on: string | undefined) =>
    `reviewed${by ? ` by ${by}` : ""}${on ? `, ${on}` : ""}`,
  inventedTitle: "This medicine does not exist",
  invented: "The record is invented for demonstration. Its figures mean nothing for any real medicine.",
  unverifiedTitle: "Figures from memory",
  unverified: (count: number, of: number) =>
    `${count} of ${of} figures are from memory and unverified. Check them against the named source before you rely on them.`,
  measuredIn: "measured in",
  appliesTo: "Applies to",
  kinetics: "Kinetics",
  apparent: "Clearance and volume are per bioavailability (CL/F and V/F): products state a bioavailability of 1.",
  figure: "figure",
  value: "value",
  source: "source",
  basis: "basis",
  clearance: "clearance",
  volume: "volume",
  molarMass: "molar mass",
  variability: "Variability between patients, and of the assay",
  residualProportional: "residual, in proportion",
  residualAdditive: "residual, added",
  absorptionRate: "absorption rate constant",
  lag: "lag before absorption",
  bioavailability: "bioavailability",
  strength: "strength",
  concentration: "concentration",
  products: "Products",
  release: { immediate: "immediate release", modified: "modified release" },
  divisible: { whole: "not to be divided", half: "may be halved", unknown: "whether it may be divided is not known" },
  swallowWhole: "swallow whole",
  windows: "Target windows",
  window: "window",
  windowsNone: "The record states no target window; one of your own can be entered on the bench.",
  toxicFrom: "toxic from",
  wardWindows: "The ward's own windows",
  wardWindowsNone: "No window of the ward's own is stored for this medicine.",
  wardWindowAdd: "Add a window",
  wardWindowStore: "Store the window",
  removeWindow: "Remove",
  cancel: "Cancel",
  doseLimits: "Dose limits",
  sampling: "Sampling",
  cautions: "Cautions",
  sources: "Sources",
  importRecord: "Import a ward's record",
  importHelp: "A JSON file in Ebbline's own record format. A figure without a source is refused.",
  importedTitle: "Record stored",
  imported: (name: string, version: number) =>
    `“${name}”, record version ${version}, is stored on this device and can be chosen for a new case.`,
  refusedTitle: (name: string) => `“${name}” was not imported`,
  remove: "Remove this record",
  removeTitle: "Remove this record?",
  removeText: (name: string) =>
    `“${name}” goes from the records on this device. Cases that use it keep their own frozen copy and are not changed.`,
  removeNow: "Remove it",
  keep: "Keep it",
  bases: {
    seen: "seen in the source",
    memory: "from memory, unverified",
    "common practice": "common practice",
    invented: "invented",
  },
} as const;

export const windowQuantityWords = {
  trough: windowQuantityWord("trough"),
  peak: windowQuantityWord("peak"),
  average: windowQuantityWord("average"),
  auc24: windowQuantityWord("auc24"),
  "lowest-and-highest": windowQuantityWord("lowest-and-highest"),
} as const;

export const settingsWords = {
  print: "Print",
  pageSize: "Page size",
  microgram: "Micrograms are written as",
  microgramHelp: "The letter µ is never used on paper: it is read as m.",
  preparedBy: "Prepared by",
  preparedByHelp: "Stands on the summary's “prepared by” line. Left empty, the line is left blank to sign.",
  keeping: "Where your work is kept",
  keepingText: "Cases stay in this browser on this machine. Nothing is sent anywhere.",
  storage: "Store",
  storageState: {
    opening: "opening",
    ready: "ready",
    lost: "gone: see Cases",
    newer: "read only, written by a newer version",
    blocked: "held by another tab",
    unavailable: "not available: nothing is kept",
  },
  casesStored: "cases stored",
  persisted: "Promise of the browser not to clear it",
  persistedState: {
    given: "given",
    "not given": "not given: the browser may clear it when space is short",
    unknown: "this browser does not say",
  },
  persistAsk: "Ask for it",
  backupTitle: "Keep a copy elsewhere",
  backup:
    "A browser can be told to clear its data when it closes, and hospital machines often are. Export a case from the Cases screen whenever it matters; the .ebbline.json file holds all of it, and importing it brings it back.",
  program: "Program",
  version: "version",
  engine: "calculation",
  offline: "Works without a network",
  offlineYes: "yes, everything needed is stored on this machine",
  offlineNo: "not yet: load the page once more while the network is there",
} as const;
