import { useState } from "react";
import { doseLineSentence, doseWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import { ChoiceField } from "../ui/ChoiceField.tsx";
import { DataTable } from "../ui/DataTable.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { DoseTextField } from "./DoseTextField.tsx";
import { doseProducts, doseProductsInFull, doseProductUsual } from "./doseProducts.ts";
import { LineForm } from "./LineForm.tsx";
import { PanelDone } from "./PanelDone.tsx";
import "./entryPanel.css";
import "./DoseEntry.css";

export interface DoseEntryProps {
  /** "given", or the id of an option. */
  readonly lane: string;
  readonly onDone: () => void;
  /** The line to show opened. */
  readonly lineId?: string;
}

/** The dose lines of a lane: typed, and edited in a form. */
export function DoseEntry({ lane, onDone, lineId }: DoseEntryProps) {
  const open = useWorkbench((state) => state.open);
  const edit = useWorkbench((state) => state.edit);
  const [editing, setEditing] = useState<string | null>(lineId ?? null);
  const [chosen, setChosen] = useState<string | null>(null);
  const [text, setText] = useState("");
  if (!open) return null;
  const { value } = open;
  const lines = lane === "given" ? value.given : (value.options.find((option) => option.id === lane)?.lines ?? []);
  const products = doseProducts(value.medicine);
  const isReadOnly = open.role === "reader";
  const product = chosen ?? doseProductUsual(value, lane);
  const edited = lines.find((line) => line.id === editing);
  const sentence = (line: (typeof lines)[number]) =>
    doseLineSentence(line, { zone: value.timeZone, products: doseProductsInFull(value.medicine) });
  return (
    <div className="entry-panel">
      {isReadOnly ? null : (
        <div className="dose-entry-add">
          {products.length > 1 ? (
            <ChoiceField
              label={doseWords.product}
              value={product}
              prompt={doseWords.productPrompt}
              choices={products.map((one) => ({ value: one.id, label: one.name }))}
              onChoose={setChosen}
            />
          ) : null}
          <DoseTextField
            value={value}
            lane={lane}
            products={products}
            product={product}
            text={text}
            label={doseWords.text}
            sendWord={doseWords.add}
            enterWord={doseWords.enterAdds}
            hasInitialFocus={lineId === undefined}
            onText={setText}
            onLines={(added) => {
              edit("linesAdd", { lane, lines: added });
              setText("");
            }}
          />
        </div>
      )}
      <DataTable
        caption={lane === "given" ? doseWords.list.given : doseWords.list.option}
        rows={lines}
        rowKey={(line) => line.id}
        empty={doseWords.none}
        columns={[
          { id: "line", head: doseWords.line, isRowHead: true, cell: (line) => `${sentence(line)}.` },
          {
            id: "actions",
            head: doseWords.actions,
            isHeadHidden: true,
            align: "end",
            cell: (line) =>
              isReadOnly ? null : (
                <span className="dose-entry-actions">
                  <Button
                    kind="quiet"
                    onPress={() => setEditing(editing === line.id ? null : line.id)}
                    name={`${editing === line.id ? doseWords.editDone : doseWords.edit}: ${sentence(line)}`}
                  >
                    {editing === line.id ? doseWords.editDone : doseWords.edit}
                  </Button>
                  <Button
                    kind="quiet"
                    onPress={() => edit("lineRemove", { lane, id: line.id })}
                    name={`${doseWords.remove}: ${sentence(line)}`}
                  >
                    {doseWords.remove}
                  </Button>
                </span>
              ),
          },
        ]}
      />
      {edited && !isReadOnly ? (
        <LineForm
          key={edited.id}
          value={value}
          lane={lane}
          line={edited}
          products={products}
          onLine={(line) => edit("lineChange", { lane, line })}
          onReplace={(replacing) => edit("lineReplace", { lane, id: edited.id, lines: replacing })}
        />
      ) : null}
      <PanelDone onDone={onDone} />
    </div>
  );
}
