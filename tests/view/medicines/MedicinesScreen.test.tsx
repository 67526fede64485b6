import { screen, waitFor, within } from "@testing-library/react";
import { describe, expect, test } from "vitest";
import { BUILT_IN_RECORDS, medicineParse, recordById, recordFigures } from "../../../src/core/medicine/index.ts";
import { issueMessage, medicinesWords, windowQuantityWord, windowWords } from "../../../src/core/messages/index.ts";
import { MedicinesScreen } from "../../../src/view/medicines/MedicinesScreen.tsx";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const own = { ...recordById("demoxiline")!, id: "ward-demoxiline", name: "ward demoxiline (invented)" };
const file = (value: unknown) => new File([JSON.stringify(value)], "ward.json", { type: "application/json" });
const picker = () => document.querySelector<HTMLInputElement>('input[type="file"]')!;
const choose = (name: string) => screen.getByRole("button", { name: new RegExp(`^${name.replace(/[()]/g, "\\$&")}`) });

describe("MedicinesScreen", () => {
  test.each(BUILT_IN_RECORDS.map((record) => [record.name, record] as const))(
    "%s: every figure stands with its source and basis",
    async (name, record) => {
      const { user, container } = await renderWorkbench(<MedicinesScreen />);
      await user.click(choose(name));
      const page = screen.getByRole("article", { name });
      const provenance = [...page.querySelectorAll(".record-page-provenance")].map((one) => one.textContent ?? "");
      for (const line of provenance) {
        expect(line).toMatch(/\[[1-9]\d*\]/);
        expect(Object.values(medicinesWords.bases).some((basis) => line.includes(basis))).toBe(true);
      }
      const statements = record.cautions.length + record.doseLimits.length + record.sampling.length + 1;
      // Strengths known in different ways take a line each, so there can be more lines than figures, never fewer.
      expect(provenance.length).toBeGreaterThanOrEqual(recordFigures(record).length + statements);
      expect(await axeFaults(container)).toEqual([]);
    },
    60_000,
  );

  test("says what is invented, what is not reviewed and how much is from memory", async () => {
    const { user } = await renderWorkbench(<MedicinesScreen />);
    expect(screen.getByText(new RegExp(medicinesWords.notReviewed))).toBeVisible();
    expect(screen.getByText(medicinesWords.unverifiedTitle)).toBeVisible();
    await user.click(choose("demoxiline (invented)"));
    expect(screen.getByText(medicinesWords.inventedTitle)).toBeVisible();
  });

  test("a ward's record is imported, shown and removed again", async () => {
    const { user, repository, state } = await renderWorkbench(<MedicinesScreen />);
    await user.upload(picker(), file(own));
    await screen.findByRole("article", { name: own.name });
    expect(screen.getByText(medicinesWords.imported(own.name, own.recordVersion))).toBeVisible();
    expect([...repository.medicines.keys()]).toEqual([own.id]);
    await user.click(screen.getByRole("button", { name: medicinesWords.remove }));
    await user.click(within(screen.getByRole("alertdialog")).getByRole("button", { name: medicinesWords.removeNow }));
    await waitFor(() => expect(state().ownMedicines).toEqual([]));
  });

  test("built-in records can't be removed", async () => {
    await renderWorkbench(<MedicinesScreen />);
    expect(screen.queryByRole("button", { name: medicinesWords.remove })).toBeNull();
  });

  test("a record with a figure without source is refused, naming the figure, and nothing is stored", async () => {
    const { source: _, ...bare } = own.molarMass;
    const bad = { ...own, molarMass: bare };
    const parsed = medicineParse(bad);
    if (parsed.ok) throw new Error("a figure without a source was taken");
    const { user, repository } = await renderWorkbench(<MedicinesScreen />);
    await user.upload(picker(), file(bad));
    await screen.findByText(medicinesWords.refusedTitle("ward.json"));
    expect(screen.getByText(new RegExp(issueMessage(parsed.issues[0]!).replace(/[.()]/g, "\\$&")))).toBeVisible();
    expect(repository.medicines.size).toBe(0);
  });

  test("a window of the ward's own is stored and removed", async () => {
    const { user, state } = await renderWorkbench(<MedicinesScreen />);
    await user.click(screen.getByRole("button", { name: medicinesWords.wardWindowAdd }));
    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.about }), windowQuantityWord("trough"));
    await user.type(screen.getByRole("textbox", { name: windowWords.low }), "8");
    await user.type(screen.getByRole("textbox", { name: windowWords.high }), "15");
    await user.type(screen.getByRole("textbox", { name: windowWords.basis }), "ward policy (invented){Enter}");
    await waitFor(() => expect(state().wardWindows).toHaveLength(1));
    expect(state().wardWindows[0]).toMatchObject({
      medicine: "theophylline",
      window: { low: { value: 8, unit: "mg/L" } },
    });
    await user.click(screen.getByRole("button", { name: new RegExp(`^${medicinesWords.removeWindow} 8 to 15`) }));
    await waitFor(() => expect(state().wardWindows).toEqual([]));
  });
});
