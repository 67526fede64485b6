import { type TargetWindow, windowSchema } from "../../core/case/index.ts";
import { type MedicineRecord, medicineParse } from "../../core/medicine/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import type { ChangeChannel } from "./changeChannel.ts";
import type { Connection } from "./createConnection.ts";
import { type SaveOutcome, saveAttempt } from "./saveFailure.ts";
import type { MedicineRow, SettingRow, WindowRow } from "./storageSchema.ts";

/** What a ward keeps beside its cases: settings, its own medicine records and target windows. */
export function createWardRows(connection: Connection, channel: ChangeChannel, clock: () => number) {
  const write = (table: string, work: Parameters<Connection["write"]>[1]): Promise<SaveOutcome> =>
    saveAttempt(clock, () => connection.write([table], work));

  /** Rows that can be read; what can't be is left where it is and said. */
  async function listGood<Row, Value>(
    table: string,
    read: (row: Row) => Result<Value>,
    name: (row: Row) => string,
  ): Promise<Value[]> {
    const rows = await connection.read((database) => database.table<Row>(table).toArray());
    const faults: Issue[] = [];
    const values = rows.flatMap((row) => {
      const result = read(row);
      if (result.ok) return [result.value];
      faults.push(issue("storage-entry-unreadable", { table, name: name(row) }), ...result.issues);
      return [];
    });
    if (faults.length > 0) channel.emit({ kind: "fault", issues: faults });
    return values;
  }

  return {
    async readSetting(key: string): Promise<unknown> {
      return (await connection.read((database) => database.table<SettingRow, string>("settings").get(key)))?.value;
    },
    writeSetting: (key: string, value: unknown) =>
      write("settings", (database) => database.table<SettingRow>("settings").put({ key, value })),

    listMedicines: (): Promise<readonly MedicineRecord[]> =>
      listGood<MedicineRow, MedicineRecord>(
        "medicines",
        ({ record }) => medicineParse(record),
        ({ id }) => id,
      ),
    saveMedicine: (record: MedicineRecord) =>
      write("medicines", (database) =>
        database.table<MedicineRow>("medicines").put({ id: record.id, savedAt: clock(), record }),
      ),
    removeMedicine: (id: string) =>
      write("medicines", (database) => database.table<MedicineRow, string>("medicines").delete(id)),

    listWindows: (): Promise<readonly WardWindow[]> =>
      listGood<WindowRow, WardWindow>("windows", windowRowRead, ({ medicine, id }) => `${medicine}: ${id}`),
    saveWindow: (medicine: string, id: string, window: TargetWindow) =>
      write("windows", (database) => database.table<WindowRow>("windows").put({ medicine, id, window })),
    removeWindow: (medicine: string, id: string) =>
      write("windows", (database) => database.table<WindowRow, [string, string]>("windows").delete([medicine, id])),
  };
}

interface WardWindow {
  readonly medicine: string;
  readonly id: string;
  readonly window: TargetWindow;
}

function windowRowRead({ medicine, id, window }: WindowRow): Result<WardWindow> {
  const parsed = windowSchema.safeParse(window);
  return parsed.success ? succeed({ medicine, id, window: parsed.data }) : fail();
}
