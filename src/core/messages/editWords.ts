import type { EditName } from "../case/index.ts";

const EDIT_WORDS: Readonly<Record<EditName, string>> = {
  caseRename: "rename the case",
  notesSet: "change the notes",
  nowSet: "move the now line",
  timeZoneSet: "change the time zone",
  fitSet: "change how levels are used",
  sexSet: "change the sex",
  ageSet: "change the age",
  heightSet: "change the height",
  observationAdd: "add an observation",
  observationChange: "change an observation",
  observationRemove: "remove an observation",
  factorAdd: "add an event",
  factorChange: "change an event",
  factorRemove: "remove an event",
  medicineSet: "change the medicine",
  windowSet: "change the target window",
  linesAdd: "add doses",
  lineChange: "change a dose line",
  lineReplace: "rewrite a dose line",
  lineRemove: "remove a dose line",
  doseMove: "move a dose",
  doseMark: "mark a dose",
  doseScale: "change a dose",
  lineStretch: "change how long a dose line runs",
  levelAdd: "add a level",
  levelChange: "change a level",
  levelMove: "move a level",
  levelRevalue: "change the value of a level",
  levelRemove: "remove a level",
  levelExclude: "leave a level out or take it back",
  optionAdd: "add an option",
  optionDuplicate: "duplicate an option",
  optionRename: "rename an option",
  optionRemove: "remove an option",
  optionChoose: "choose an option",
};

/** What an edit is called beside Undo and Redo: "move a dose". */
export function editLabel(name: EditName): string {
  return EDIT_WORDS[name];
}
