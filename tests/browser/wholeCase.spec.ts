import { expectFit, expectOfflineReady, expectSaved, pressOn, reading, tabTo, typeInto } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

test("a whole case by typing only; reload; offline and the server gone; reload again: everything is there", async ({
  page,
  context,
  program,
}) => {
  await page.goto("/");
  await expectOfflineReady(page);

  // The case.
  await typeInto(page, page.getByRole("textbox", { name: "Label" }), "Quay ward 2, bed 7");
  await tabTo(page, page.getByRole("combobox", { name: "Medicine" }));
  await page.keyboard.type("theo");
  await tabTo(page, page.getByRole("combobox", { name: "Time zone" }));
  await page.keyboard.type("Europe/Lisbon");
  await typeInto(page, page.getByRole("textbox", { name: "The now line" }), "4 March 2026 12:00");
  await pressOn(page, page.getByRole("button", { name: "Start the case" }));
  const strip = page.getByRole("banner");
  await expect(strip).toContainText("Quay ward 2, bed 7");

  // The patient.
  await pressOn(page, strip.getByRole("button", { name: /^weight/ }));
  const patient = page.getByRole("dialog", { name: "Patient" });
  await typeInto(page, patient.getByRole("textbox", { name: "Age" }), "64");
  await typeInto(page, patient.getByRole("textbox", { name: "Height" }), "162");
  await tabTo(page, patient.getByRole("radio", { name: "female" }));
  await page.keyboard.press("Space");
  await typeInto(page, patient.getByRole("textbox", { name: "Weight" }), "58");
  await page.keyboard.press("Enter");
  await expect(patient.getByRole("rowheader", { name: "58 kg" })).toBeVisible();
  await typeInto(page, patient.getByRole("textbox", { name: "Serum creatinine" }), "0.93");
  await page.keyboard.press("Enter");
  await expect(patient.getByText("52.3 mL/min")).toBeVisible();
  await page.keyboard.press("Escape");

  // The window.
  await pressOn(page, strip.getByRole("button", { name: /^target window/ }));
  const window = page.getByRole("dialog", { name: "Target window" });
  await tabTo(page, window.getByRole("radio").first());
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("Space");
  await page.keyboard.press("Escape");
  await expect(strip).toContainText("5 to 15 mg/L");

  // The doses given.
  await pressOn(page, page.getByRole("button", { name: "Given", exact: true }));
  const doses = page.getByRole("dialog", { name: "Doses given" });
  await tabTo(page, doses.getByRole("combobox", { name: "Product" }));
  await page.keyboard.type("12-hour");
  const text = doses.getByRole("textbox", { name: "Type a dose" });
  await typeInto(page, text, "200 mg every 12 h from 1 March 08:00, 7 doses");
  await expect(doses).toContainText("last Wednesday 4 March at 08:00: 7 doses");
  await page.keyboard.press("Enter");
  await expect(doses.getByRole("rowheader", { name: /200 mg/ })).toBeVisible();
  await page.keyboard.press("Escape");

  // Two levels.
  await pressOn(page, page.getByRole("button", { name: "Levels", exact: true }));
  const levels = page.getByRole("dialog", { name: "Measured levels" });
  for (const [value, drawn] of [
    ["5.3", "3 March 14:00"],
    ["5", "4 March 07:30"],
  ] as const) {
    await typeInto(page, levels.getByRole("textbox", { name: "Concentration" }), value);
    await typeInto(page, levels.getByRole("textbox", { name: "Drawn at" }), drawn);
    await pressOn(page, levels.getByRole("button", { name: "Add a level" }));
    await expect(levels.getByRole("cell", { name: `${value} mg/L`, exact: true })).toBeVisible();
  }
  await page.keyboard.press("Escape");

  // Two options.
  for (const [id, lines] of [
    ["A", ["300 mg every 12 h from 20:00"]],
    ["B", ["200 mg at 08:00 and 300 mg at 22:00 for 7 days"]],
  ] as const) {
    await pressOn(page, page.getByRole("button", { name: "Add an option" }));
    const option = page.getByRole("dialog", { name: `Option ${id}` });
    for (const line of lines) {
      await typeInto(page, option.getByRole("textbox", { name: "Type a dose" }), line);
      await expect(option).toContainText(/first dose/i);
      await page.keyboard.press("Enter");
    }
    if (id === "A") await pressOn(page, option.getByRole("button", { name: "Choose", exact: true }));
    await page.keyboard.press("Escape");
  }
  await expect(reading(page, "peak", 1)).toBeVisible();
  await expectSaved(page);
  await expectFit(page);

  const facts = async () => ({
    strip: (await strip.innerText()).replace(/saved \d\d:\d\d/, "saved"),
    given: await page.getByRole("region", { name: "Given" }).innerText(),
    a: await page.getByRole("region", { name: "Option A" }).innerText(),
    b: await page.getByRole("region", { name: "Option B" }).innerText(),
    readings: await page.getByRole("complementary").innerText(),
    levels: await page.locator(".profile-level-value").allTextContents(),
  });
  const before = await facts();
  expect(before.levels).toEqual(["5.3", "5"]);
  expect(before.readings).toContain("this patient: 2 levels used");
  expect(before.strip).toMatch(/woman, 64 years, 162\scm/);

  const reopen = async () => {
    await page.reload();
    await expect(reading(page, "peak", 1)).toBeVisible();
    await expectFit(page);
  };
  await reopen();
  expect(await facts()).toEqual(before);

  await context.setOffline(true);
  await program.stop();
  await reopen();
  expect(await facts()).toEqual(before);

  // And it still works: an edit is made and kept.
  await page.getByRole("slider", { name: "Dose 1" }).first().focus();
  await page.keyboard.press("ArrowRight");
  await expectSaved(page);
  await reopen();
  await expect(page.getByRole("slider", { name: "Dose 1" }).first()).toHaveAttribute("aria-valuetext", /08:15/);
  await context.setOffline(false);
});
