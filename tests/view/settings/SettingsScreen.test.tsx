import { screen, waitFor } from "@testing-library/react";
import { describe, expect, test } from "vitest";
import { version } from "../../../package.json";
import { settingsWords } from "../../../src/core/messages/index.ts";
import { SettingsScreen } from "../../../src/view/settings/SettingsScreen.tsx";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

describe("SettingsScreen", () => {
  test("page size, microgram wording and the name are kept", async () => {
    const { user, state, repository, container } = await renderWorkbench(<SettingsScreen />);
    expect(screen.getByRole("radio", { name: "A4" })).toBeChecked();
    await user.click(screen.getByRole("radio", { name: "Letter" }));
    await user.click(screen.getByRole("radio", { name: "mcg" }));
    await user.type(screen.getByRole("textbox", { name: settingsWords.preparedBy }), "A. Invented, pharmacist{Enter}");
    const expected = { pageSize: "Letter", microgram: "mcg", preparedBy: "A. Invented, pharmacist" };
    await waitFor(() => expect(state().settings).toEqual(expected));
    expect([...repository.settings.values()]).toContainEqual(expected);
    expect(await axeFaults(container)).toEqual([]);
  });

  test("says the version and the state of the store", async () => {
    await renderWorkbench(<SettingsScreen />);
    expect(screen.getByText(`Ebbline ${version}`)).toBeVisible();
    expect(screen.getByText(settingsWords.storageState.ready)).toBeVisible();
    expect(screen.getByText(settingsWords.backup)).toBeVisible();
  });

  test("other screens are a key press away", async () => {
    const { user, state } = await renderWorkbench(<SettingsScreen />);
    await user.tab();
    await user.keyboard("{Enter}");
    expect(state().screen).toBe("cases");
  });
});
