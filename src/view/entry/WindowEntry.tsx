import { useState } from "react";
import type { TargetWindow } from "../../core/case/index.ts";
import { windowAboutWords, windowWords } from "../../core/messages/index.ts";
import { numberPrint, quantityPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { RadioField } from "../ui/RadioField.tsx";
import { NO_WINDOW_TYPED, WindowForm, type WindowTyped } from "../ui/WindowForm.tsx";
import { EMPTY_WINDOW, windowDraft, windowDraftEmpty } from "../ui/windowDraft.ts";
import { useWorkbench } from "../useWorkbench.ts";
import { PanelDone } from "./PanelDone.tsx";
import { type OfferedWindow, windowOfferOf, windowOffers } from "./windowOffers.ts";
import "./entryPanel.css";

export interface WindowEntryProps {
  readonly onDone: () => void;
}

const OWN = "own";

/** The window of the case: one of the record's, one of the ward's, or typed. None is chosen beforehand. */
export function WindowEntry({ onDone }: WindowEntryProps) {
  const open = useWorkbench((state) => state.open);
  const wardWindows = useWorkbench((state) => state.wardWindows);
  const edit = useWorkbench((state) => state.edit);
  const current = open?.value.window;
  const offers = open ? windowOffers(open.value.medicine, wardWindows) : [];
  const offered = current ? windowOfferOf(current, offers) : null;
  const [isOwn, setOwn] = useState(() => current !== undefined && offered === null);
  const [typed, setTyped] = useState<WindowTyped>(() => ({
    ...NO_WINDOW_TYPED,
    draft: current ? windowDraft(current) : open ? windowDraftEmpty(open.value.medicine) : EMPTY_WINDOW,
  }));
  if (!open) return null;
  const isReadOnly = open.role === "reader";
  return (
    <div className="entry-panel">
      <p>
        {windowWords.current}: <strong>{current ? windowSentence(current) : windowWords.none}</strong>
      </p>
      <RadioField
        label={windowWords.choose}
        arrangement="list"
        isReadOnly={isReadOnly}
        value={isOwn ? OWN : (offered?.id ?? null)}
        choices={[
          ...offers.map((offer) => ({ value: offer.id, label: offer.label, detail: offerDetail(offer) })),
          { value: OWN, label: windowWords.own, detail: windowWords.ownDetail },
        ]}
        onChoose={(id) => {
          setOwn(id === OWN);
          const offer = offers.find((one) => one.id === id);
          if (offer) edit("windowSet", { window: offer.window });
        }}
      />
      {isOwn && !isReadOnly ? (
        <WindowForm
          className="entry-panel-form entry-panel-inset"
          typed={typed}
          onTyped={setTyped}
          record={open.value.medicine}
          isAnswered={(window) => current?.confirmed === true && isSameRange(current, window)}
          onWindow={(window) => edit("windowSet", { window })}
        >
          <div>
            <Button kind="main" type="submit">
              {windowWords.set}
            </Button>
          </div>
        </WindowForm>
      ) : null}
      {current && !isReadOnly ? (
        <div>
          <Button
            kind="quiet"
            onPress={() => {
              setOwn(false);
              edit("windowSet", { window: null });
            }}
          >
            {windowWords.clear}
          </Button>
        </div>
      ) : null}
      <PanelDone onDone={onDone} />
    </div>
  );
}

/** The answer given for these ends holds while only the words about them change. */
function isSameRange(a: TargetWindow, b: TargetWindow): boolean {
  return JSON.stringify([a.low, a.high]) === JSON.stringify([b.low, b.high]);
}

function windowSentence(window: TargetWindow): string {
  const { low, high, basis } = window;
  const top = quantityPrint(high, { style: "screen", significant: 4 });
  return `${numberPrint(low.value, { significant: 4 })} to ${top}, ${windowAboutWords(window)} (${basis})`;
}

function offerDetail({ window, from, origin }: OfferedWindow): string {
  const place = from === "record" ? windowWords.fromRecord : windowWords.fromWard;
  return `${windowAboutWords(window)}; ${place}: ${origin}`;
}
