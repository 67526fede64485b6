import type { DoseMark } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { productOf } from "../../core/medicine/index.ts";
import { instantText } from "../../core/time/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import { Button } from "../ui/Button.tsx";
import { SNAP_MIN } from "./gestures/tokenSnap.ts";
import "./TokenBar.css";
import { useTokenActions } from "./useTokenActions.ts";

interface TokenBarProps {
  readonly mark: DoseMark;
  readonly lane: string;
  readonly value: Case;
  readonly originMs: number;
  readonly x: number;
  readonly isReadOnly: boolean;
  readonly onClose: () => void;
  readonly onOpenLine: () => void;
}

/** Everything a drag does, by single presses: shown beside the pressed token. */
export function TokenBar(props: TokenBarProps) {
  const { mark, lane, value } = props;
  const actions = useTokenActions(value, lane, mark, props.originMs);
  const at = instantText(props.originMs + mark.atH * 3_600_000, value.timeZone, "dayClock");
  const product = productOf(value.medicine, mark.product);
  return (
    <div className="token-bar" style={{ left: props.x }} role="group" aria-label={`Dose of ${at}`}>
      <p className="token-bar-words">
        <strong>{quantityPrint(mark.amount, { style: "screen", microgram: "microgram" })}</strong>, {product.name}, {at}
        {mark.status === "missed" ? ", missed" : ""}
      </p>
      {!props.isReadOnly && (
        <div className="token-bar-buttons">
          <Button onPress={() => actions.moveByMinutes(-SNAP_MIN)}>{SNAP_MIN} min earlier</Button>
          <Button onPress={() => actions.moveByMinutes(SNAP_MIN)}>{SNAP_MIN} min later</Button>
          {mark.status !== "missed" && (
            <>
              <Button onPress={() => actions.step(-1)}>Less</Button>
              <Button onPress={() => actions.step(1)}>More</Button>
            </>
          )}
          <Button onPress={actions.toggleMissed}>
            {mark.status === "missed" ? "It was taken" : lane === "given" ? "Missed" : "Leave out"}
          </Button>
          <Button onPress={props.onOpenLine}>Edit the line</Button>
        </div>
      )}
      <Button kind="quiet" onPress={props.onClose} name="Close the dose's buttons">
        Close
      </Button>
    </div>
  );
}
