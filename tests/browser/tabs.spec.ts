import { expectSaved, openDemo, openStored } from "./support/caseSteps.ts";
import { expect, test } from "./support/test.ts";

test("two tabs on one case: one writes, the other reads, is told so, sees the changes and takes over when the first closes", async ({
  page,
  context,
}) => {
  await openDemo(page, "Harbour ward 3, bed 12");
  const second = await context.newPage();
  await openStored(second, "Harbour ward 3, bed 12");
  await expect(second.locator("[data-saving]")).toHaveAttribute("data-saving", "read-only");
  await expect(second.getByText(/another tab/i).first()).toBeVisible();
  await expect(second.getByRole("button", { name: "Add an option" })).toBeDisabled();

  await page.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" }).focus();
  await page.keyboard.press("ArrowRight");
  await expectSaved(page);
  await expect(second.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" })).toHaveAttribute(
    "aria-valuetext",
    /20:15/,
  );

  await page.close();
  await expect(second.getByRole("button", { name: "Add an option" })).toBeEnabled();
  await second.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" }).focus();
  await second.keyboard.press("ArrowRight");
  await expectSaved(second);
  await expect(second.getByRole("region", { name: "Given" }).getByRole("slider", { name: "Dose 2" })).toHaveAttribute(
    "aria-valuetext",
    /20:30/,
  );
});
