import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, test, vi } from "vitest";
import { fieldWords, issueMessage } from "../../../src/core/messages/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { clockInstant } from "../../../src/core/time/index.ts";
import { InstantField, type InstantFieldProps } from "../../../src/view/ui/InstantField.tsx";

const ZONE = "Europe/London";

interface OwnerProps {
  readonly start: string;
  readonly onCommit: (iso: string) => void;
  readonly change: Partial<InstantFieldProps>;
}

function Owner({ start, onCommit, change }: OwnerProps) {
  const [value, setValue] = useState(start);
  return (
    <InstantField
      label="Taken at"
      value={value}
      zone={ZONE}
      now={start}
      onCommit={(iso) => {
        onCommit(iso);
        setValue(iso);
      }}
      {...change}
    />
  );
}

function show(start: string, change: Partial<InstantFieldProps> = {}) {
  const onCommit = vi.fn<(iso: string) => void>();
  render(<Owner start={start} onCommit={onCommit} change={change} />);
  const field = screen.getByRole<HTMLInputElement>("textbox", { name: "Taken at" });
  return { field, onCommit, user: userEvent.setup() };
}

const sentence = (date: string, time: string) => {
  const read = clockInstant(date, time, ZONE);
  if (read.ok) throw new Error(`${date} ${time} exists once`);
  return issueMessage(read.issues[0]!);
};

describe("InstantField", () => {
  test("says back what is typed in full words while it is typed", async () => {
    const { field, user, onCommit } = show("2026-03-04T12:00:00+00:00");
    await user.clear(field);
    await user.type(field, "7:30");
    expect(screen.getByText(fieldWords.understood("Wednesday 4 March 2026, 07:30"))).toBeVisible();
    expect(onCommit).not.toHaveBeenCalled();
    await user.keyboard("{Enter}");
    expect(onCommit.mock.calls).toEqual([["2026-03-04T07:30:00+00:00"]]);
    expect(field).toHaveValue("Wed 4 March 2026 07:30");
  });

  test("a clock time that the clocks skip is answered with a sentence and kept", async () => {
    const { field, user, onCommit } = show("2026-03-28T12:00:00+00:00");
    await user.clear(field);
    await user.type(field, "2026-03-29 01:30{Enter}");
    expect(screen.getByRole("status")).toHaveTextContent(sentence("2026-03-29", "01:30"));
    expect(field).toHaveValue("2026-03-29 01:30");
    expect(field).toBeInvalid();
    expect(onCommit).not.toHaveBeenCalled();
  });

  test("a clock time that comes twice asks which; either can be chosen by keyboard", async () => {
    const { field, user, onCommit } = show("2026-10-24T12:00:00+01:00");
    await user.clear(field);
    await user.type(field, "2026-10-25 01:30{Enter}");
    expect(screen.getByRole("status")).toHaveTextContent(sentence("2026-10-25", "01:30"));
    expect(onCommit).not.toHaveBeenCalled();
    const answers = screen.getAllByRole("button");
    expect(answers).toHaveLength(2);
    await user.tab();
    await user.tab();
    expect(answers[1]).toHaveFocus();
    await user.keyboard("{Enter}");
    expect(onCommit.mock.calls).toEqual([["2026-10-25T01:30:00+00:00"]]);
    expect(field).toHaveValue("Sun 25 October 2026 01:30 (UTC+00:00)");
  });

  test("what can't be read is kept and said on leaving", async () => {
    const { field, user, onCommit } = show("2026-03-04T12:00:00+00:00");
    await user.clear(field);
    await user.type(field, "03/04/2026 07:30");
    expect(screen.getByRole("status")).toBeEmptyDOMElement();
    await user.tab();
    expect(screen.getByRole("status")).toHaveTextContent(
      issueMessage(issue("instant-numeric-date", { part: "03/04/2026" })),
    );
    expect(field).toHaveValue("03/04/2026 07:30");
    expect(onCommit).not.toHaveBeenCalled();
  });

  test("an owner's refusal stands beside the field", async () => {
    const refusal = issue("level-no-dose");
    const { field, user, onCommit } = show("2026-03-04T12:00:00+00:00", { refuse: () => refusal });
    await user.clear(field);
    await user.type(field, "07:30{Enter}");
    expect(field).toHaveAccessibleDescription(expect.stringContaining(issueMessage(refusal)));
    expect(onCommit).not.toHaveBeenCalled();
  });
});
