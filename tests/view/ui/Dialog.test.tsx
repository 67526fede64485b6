import { render, screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { expect, test } from "vitest";
import { Button } from "../../../src/view/ui/Button.tsx";
import { Dialog } from "../../../src/view/ui/Dialog.tsx";
import { Notice } from "../../../src/view/ui/Notice.tsx";

function Page() {
  const [isOpen, setOpen] = useState(false);
  return (
    <>
      <Button onPress={() => setOpen(true)}>Ask</Button>
      <Dialog title="Remove it?" isOpen={isOpen} onClose={() => setOpen(false)} isAlert>
        <Button onPress={() => setOpen(false)} hasInitialFocus>
          Keep it
        </Button>
      </Dialog>
    </>
  );
}

test("Escape closes, and the focus goes back to where it came from", async () => {
  const user = userEvent.setup();
  render(<Page />);
  await user.tab();
  await user.keyboard("{Enter}");
  expect(screen.getByRole("alertdialog", { name: "Remove it?" })).toBeVisible();
  expect(screen.getByRole("button", { name: "Keep it" })).toHaveFocus();
  await user.keyboard("{Escape}");
  expect(screen.queryByRole("alertdialog")).toBeNull();
  // Given back in the next frame.
  await waitFor(() => expect(screen.getByRole("button", { name: "Ask" })).toHaveFocus());
});

test("a notice says its gravity in a word", () => {
  render(
    <>
      <Notice gravity="stop">a</Notice>
      <Notice gravity="check">b</Notice>
      <Notice gravity="note">c</Notice>
    </>,
  );
  expect(screen.getByText("Stop")).toBeVisible();
  expect(screen.getByText("Check")).toBeVisible();
  expect(screen.getByText("Note")).toBeVisible();
});
