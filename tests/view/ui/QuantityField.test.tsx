import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, test, vi } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import type { Quantity } from "../../../src/core/units/index.ts";
import { QuantityField, type QuantityFieldProps, type QuantityLook } from "../../../src/view/ui/QuantityField.tsx";

type Unit = "kg" | "[lb_av]";
type Shown = Quantity<Unit> | null;

interface OwnerProps {
  readonly start: Shown;
  readonly onCommit: (value: Shown, isConfirmed: boolean) => void;
  readonly change: Partial<QuantityFieldProps<Unit>>;
}

function Owner({ start, onCommit, change }: OwnerProps) {
  const [value, setValue] = useState<Shown>(start);
  return (
    <>
      <QuantityField<Unit>
        label="Weight"
        value={value}
        units={["kg", "[lb_av]"]}
        unit="kg"
        onCommit={(next, isConfirmed) => {
          onCommit(next, isConfirmed);
          setValue(next);
        }}
        {...change}
      />
      <button type="button" onClick={() => setValue(start)}>
        Undo
      </button>
    </>
  );
}

function show(change: Partial<QuantityFieldProps<Unit>> = {}, start: Shown = null) {
  const onCommit = vi.fn<(value: Shown, isConfirmed: boolean) => void>();
  render(<Owner start={start} onCommit={onCommit} change={change} />);
  const field = () => screen.getByRole<HTMLInputElement>("textbox", { name: "Weight" });
  return { onCommit, field, user: userEvent.setup() };
}

const isOdd = (typed: Quantity<Unit>): QuantityLook<Unit> =>
  typed.unit === "kg" && typed.value > 150
    ? {
        kind: "asked",
        ask: {
          text: "Is it meant in kilograms?",
          answers: [
            { label: "It is kg", value: typed, isConfirmed: true },
            { label: "It is lb", value: { value: typed.value, unit: "[lb_av]" }, isConfirmed: false },
          ],
        },
      }
    : { kind: "fine" };

describe("QuantityField", () => {
  test("1,5 is refused with the sentence, the text stays and nothing counts", async () => {
    const { user, field, onCommit } = show();
    await user.type(field(), "1,5{Enter}");
    const read = issueMessage(issue("number-comma", { text: "1,5", suggestion: "1.5" }));
    expect(read).toContain("1.5");
    expect(screen.getByRole("status")).toHaveTextContent(read);
    expect(field()).toHaveValue("1,5");
    expect(field()).toBeInvalid();
    expect(field()).toHaveAccessibleDescription(read);
    expect(onCommit).not.toHaveBeenCalled();
    await user.clear(field());
    await user.type(field(), "1.5{Enter}");
    expect(onCommit).toHaveBeenLastCalledWith({ value: 1.5, unit: "kg" }, false);
    expect(field()).toBeValid();
  });

  test("counts on Enter and on leaving, once", async () => {
    const { user, field, onCommit } = show();
    await user.type(field(), "58{Enter}");
    await user.tab();
    expect(onCommit.mock.calls).toEqual([[{ value: 58, unit: "kg" }, false]]);
    await user.clear(field());
    await user.type(field(), "59");
    await user.tab();
    expect(onCommit.mock.calls.at(-1)).toEqual([{ value: 59, unit: "kg" }, false]);
    expect(onCommit).toHaveBeenCalledTimes(2);
  });

  test("what was typed stays as typed when it reads the same", async () => {
    const { user, field, onCommit } = show();
    await user.type(field(), "58.0{Enter}");
    expect(onCommit).toHaveBeenCalledWith({ value: 58, unit: "kg" }, false);
    expect(field()).toHaveValue("58.0");
  });

  test("a unit typed after the number counts and moves to the choice", async () => {
    const { user, field, onCommit } = show();
    await user.type(field(), "128 lb{Enter}");
    expect(onCommit).toHaveBeenCalledWith({ value: 128, unit: "[lb_av]" }, false);
    expect(field()).toHaveValue("128");
    expect(screen.getByRole("combobox", { name: "Weight: unit" })).toHaveValue("[lb_av]");
  });

  test("another unit says what the number was in; the number is not converted", async () => {
    const { user, field, onCommit } = show({}, { value: 128, unit: "kg" });
    await user.selectOptions(screen.getByRole("combobox", { name: "Weight: unit" }), "[lb_av]");
    expect(field()).toHaveValue("128");
    expect(onCommit).toHaveBeenLastCalledWith({ value: 128, unit: "[lb_av]" }, false);
  });

  test("an odd value is asked about and counts only with an answer", async () => {
    const { user, field, onCommit } = show({ look: isOdd });
    await user.type(field(), "180{Enter}");
    expect(screen.getByRole("status")).toHaveTextContent("Is it meant in kilograms?");
    expect(onCommit).not.toHaveBeenCalled();
    await user.click(screen.getByRole("button", { name: "It is lb" }));
    expect(onCommit.mock.calls).toEqual([[{ value: 180, unit: "[lb_av]" }, false]]);
    expect(screen.queryByText("Is it meant in kilograms?")).toBeNull();
  });

  test("the answer that it is meant says so; keyboard alone suffices", async () => {
    const { user, field, onCommit } = show({ look: isOdd });
    await user.type(field(), "180{Enter}");
    await user.tab();
    await user.tab();
    expect(screen.getByRole("button", { name: "It is kg" })).toHaveFocus();
    await user.keyboard("{Enter}");
    expect(onCommit.mock.calls).toEqual([[{ value: 180, unit: "kg" }, true]]);
  });

  test("emptied, it commits nothing where something was, and nothing where nothing was", async () => {
    const { user, field, onCommit } = show({}, { value: 58, unit: "kg" });
    await user.clear(field());
    await user.tab();
    expect(onCommit.mock.calls).toEqual([[null, false]]);
    await user.click(field());
    await user.tab();
    expect(onCommit).toHaveBeenCalledTimes(1);
  });

  test("a change from outside (undo) is shown", async () => {
    const { user, field, onCommit } = show({}, { value: 58, unit: "kg" });
    await user.clear(field());
    await user.type(field(), "60{Enter}");
    await user.click(screen.getByRole("button", { name: "Undo" }));
    expect(field()).toHaveValue("58");
    expect(onCommit).toHaveBeenCalledTimes(1);
  });
});
