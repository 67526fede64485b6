import { render, screen, within } from "@testing-library/react";
import { expect, test } from "vitest";
import { DataTable } from "../../../src/view/ui/DataTable.tsx";
import { axeFaults } from "./axeFaults.ts";

const columns = [
  { id: "name", head: "name", isRowHead: true, cell: (row: { name: string; mg: number }) => row.name },
  { id: "mg", head: "mg", align: "end", cell: (row: { name: string; mg: number }) => String(row.mg) },
  { id: "do", head: "actions", isHeadHidden: true, cell: () => <button type="button">Remove</button> },
] as const;

test("a table has its caption, heads and row heads", async () => {
  const { container } = render(
    <DataTable caption="Doses" columns={columns} rows={[{ name: "a", mg: 200 }]} rowKey={(row) => row.name} />,
  );
  const table = screen.getByRole("table", { name: "Doses" });
  expect(
    within(table)
      .getAllByRole("columnheader")
      .map((head) => head.textContent),
  ).toEqual(["name", "mg", "actions"]);
  expect(within(table).getByRole("rowheader")).toHaveTextContent("a");
  expect(await axeFaults(container)).toEqual([]);
});

test("without rows the sentence stands in its place", () => {
  render(<DataTable caption="Doses" columns={columns} rows={[]} rowKey={(row) => row.name} empty="No dose yet." />);
  expect(screen.queryByRole("table")).toBeNull();
  expect(screen.getByText("No dose yet.")).toBeVisible();
});
