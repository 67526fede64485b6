import type { KeyboardEvent } from "react";
import type { Case, Level } from "../../core/case/index.ts";
import { dragWords, fitWords } from "../../core/messages/index.ts";
import { instantMs, instantText } from "../../core/time/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import type { ProfileScene } from "../chart/profileScene.ts";
import type { OpenLevel } from "../entry/LevelTable.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { levelIsAsked, levelTimeNudged, levelValueNudged } from "./gestures/levelPlace.ts";
import { useLevelDrag } from "./gestures/useLevelDrag.ts";

interface LevelHandleProps {
  readonly value: Case;
  readonly level: Level;
  /** Its place in the list, from 1. */
  readonly place: number;
  readonly scene: ProfileScene;
  readonly atH: number;
  readonly x: number;
  readonly y: number;
  readonly hintId: string;
  readonly isReadOnly: boolean;
  readonly onOpen: (form: OpenLevel["form"]) => void;
  /** Being dragged. */
  readonly isHeld: boolean;
  /** While it is dragged: what changes, from what to what. */
  readonly onWords: (words: string | null) => void;
}

/** Half the side of what can be taken hold of, px. */
const REACH = 13;
const ARM = 6;

/** What a level is taken hold of by, over its mark: dragged along the clock or up and down, moved with arrow keys, opened with Enter. */
export function LevelHandle(props: LevelHandleProps) {
  const { value, level, scene, atH, x, y, onOpen } = props;
  const edit = useWorkbench((state) => state.edit);
  const { id, quantity } = level;
  const isFixed = props.isReadOnly || level.excluded !== undefined;
  const start = useLevelDrag({ value, level, scene, onOpen: () => onOpen("change"), onWords: props.onWords });

  const reviseBy = (direction: -1 | 1) => {
    const number = levelValueNudged(value, level, direction);
    if (levelIsAsked(value, level, number)) onOpen("change");
    else edit("levelRevalue", { id, number }, id);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey) return;
    const isUpDown = event.key === "ArrowUp" || event.key === "ArrowDown";
    const direction = event.key === "ArrowLeft" || event.key === "ArrowDown" ? -1 : 1;
    if (event.key === "Enter") onOpen("change");
    else if (isFixed) return;
    else if (event.key === "Delete") onOpen("reason");
    // With Alt only: a measured value is not to be changed by a stray key.
    else if (isUpDown && event.altKey) reviseBy(direction);
    else if ((event.key === "ArrowLeft" || event.key === "ArrowRight") && !event.altKey)
      edit("levelMove", { id, at: levelTimeNudged(value, level, direction, event.shiftKey) }, id);
    else return;
    event.preventDefault();
  };

  const atMs = instantMs(level.at);
  const measured = quantityPrint(quantity, { style: "screen" });
  const spoken = [
    instantText(atMs, value.timeZone, "dayClock"),
    level.kind === "below-limit" ? `below ${measured}` : measured,
    ...(level.excluded === undefined ? [] : [fitWords.leftOut(level.excluded)]),
  ].join(", ");
  return (
    <g
      className={`level-handle${isFixed ? " level-handle-fixed" : ""}`}
      role="slider"
      tabIndex={0}
      aria-label={dragWords.levelName(props.place)}
      aria-valuemin={scene.clock.fromH}
      aria-valuemax={scene.clock.toH}
      aria-valuenow={Math.round(atH * 60) / 60}
      aria-valuetext={spoken}
      aria-readonly={isFixed}
      aria-describedby={props.hintId}
      data-at={level.at}
      data-value={quantity.value}
      onKeyDown={onKeyDown}
      {...(isFixed ? { onClick: () => onOpen("change") } : { onPointerDown: start })}
    >
      <rect className="level-handle-hit" x={x - REACH} y={y - REACH} width={2 * REACH} height={2 * REACH} />
      {/* The mark below waits for the curve; this one is where the hand is. */}
      {props.isHeld && (
        <path className="level-handle-mark" d={`M${x - ARM} ${y}h${2 * ARM}M${x} ${y - ARM}v${2 * ARM}`} />
      )}
    </g>
  );
}
