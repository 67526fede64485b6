import type { Case, TargetWindow } from "../../../src/core/case/index.ts";
import type { MedicineRecord } from "../../../src/core/medicine/index.ts";
import { fail, issue, type Result, succeed } from "../../../src/core/result/index.ts";
import type { CaseRepository, SaveOutcome, StorageChange, StorageState } from "../../../src/shell/store/ports.ts";
import { type Deferred, deferred } from "./deferred.ts";

/** A repository in memory. Saves can be held (`hold`), then each is settled by hand; what is not held is stored at once. */
export class MemoryRepository implements CaseRepository {
  state: StorageState = { kind: "ready" };
  readonly cases = new Map<string, Case>();
  readonly savedAt = new Map<string, number>();
  readonly settings = new Map<string, unknown>();
  readonly medicines = new Map<string, MedicineRecord>();
  readonly windows = new Map<string, { medicine: string; id: string; window: TargetWindow }>();
  /** Every save begun, in order. */
  readonly saves: { readonly value: Case; readonly outcome: Deferred<SaveOutcome> }[] = [];
  readonly claimed = new Map<string, () => void>();
  readonly released: string[] = [];
  /** Cases another tab is the writer of. */
  readonly elsewhere = new Set<string>();
  hold = false;
  /** What every save, of whatever, is answered while set. */
  refusal: Extract<SaveOutcome, { ok: false }> | null = null;
  lossAccepted = 0;
  #listeners = new Set<(change: StorageChange) => void>();
  #now = 0;

  emit(change: StorageChange): void {
    for (const listener of this.#listeners) listener(change);
  }

  async open(): Promise<StorageState> {
    return this.state;
  }
  async acceptLoss(): Promise<void> {
    this.lossAccepted += 1;
    this.state = { kind: "ready" };
  }
  async list() {
    return [...this.cases.values()].map((value) => ({
      id: value.id,
      label: value.label,
      medicine: value.medicine.name,
      demo: value.demo === true,
      savedAt: this.savedAt.get(value.id) ?? 0,
    }));
  }
  async load(id: string): Promise<Result<Case>> {
    const value = this.cases.get(id);
    return value ? succeed(value) : fail(issue("storage-case-gone", { id }));
  }
  save(value: Case): Promise<SaveOutcome> {
    const outcome = deferred<SaveOutcome>();
    this.saves.push({ value, outcome });
    if (!this.hold) outcome.resolve(this.#done(() => this.store(value)));
    return outcome.promise;
  }
  store(value: Case): number {
    this.#now += 1;
    this.cases.set(value.id, value);
    this.savedAt.set(value.id, this.#now);
    return this.#now;
  }
  /** Settles the oldest held save. */
  settleSave(refusal: Extract<SaveOutcome, { ok: false }> | null = null): void {
    const save = this.saves.find((each) => !this.#settled.has(each));
    if (!save) throw new Error("no save is held");
    this.#settled.add(save);
    save.outcome.resolve(refusal ?? { ok: true, savedAt: this.store(save.value) });
  }
  #settled = new Set<object>();
  #done(work: () => unknown): SaveOutcome {
    if (this.refusal) return this.refusal;
    work();
    return { ok: true, savedAt: this.#now };
  }
  async remove(id: string): Promise<SaveOutcome> {
    if (this.elsewhere.has(id)) return { ok: false, reason: "read-only", detail: "other-tab" };
    return this.#done(() => this.cases.delete(id));
  }
  async claim(id: string, onWriter: () => void): Promise<"writer" | "reader"> {
    if (this.claimed.has(id)) throw new RangeError(`"${id}" is claimed already`);
    this.claimed.set(id, onWriter);
    return this.elsewhere.has(id) ? "reader" : "writer";
  }
  async release(id: string): Promise<void> {
    this.claimed.delete(id);
    this.released.push(id);
  }
  async readSetting(key: string): Promise<unknown> {
    return this.settings.get(key);
  }
  async writeSetting(key: string, value: unknown): Promise<SaveOutcome> {
    return this.#done(() => this.settings.set(key, value));
  }
  async listMedicines() {
    return [...this.medicines.values()];
  }
  async saveMedicine(record: MedicineRecord): Promise<SaveOutcome> {
    return this.#done(() => this.medicines.set(record.id, record));
  }
  async removeMedicine(id: string): Promise<SaveOutcome> {
    return this.#done(() => this.medicines.delete(id));
  }
  async listWindows() {
    return [...this.windows.values()];
  }
  async saveWindow(medicine: string, id: string, window: TargetWindow): Promise<SaveOutcome> {
    return this.#done(() => this.windows.set(`${medicine}/${id}`, { medicine, id, window }));
  }
  async removeWindow(medicine: string, id: string): Promise<SaveOutcome> {
    return this.#done(() => this.windows.delete(`${medicine}/${id}`));
  }
  subscribe(listener: (change: StorageChange) => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }
}
