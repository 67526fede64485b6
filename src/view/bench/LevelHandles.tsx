import { useId, useState } from "react";
import type { Case } from "../../core/case/index.ts";
import { dragWords } from "../../core/messages/index.ts";
import { instantMs } from "../../core/time/index.ts";
import { quantityConvert } from "../../core/units/index.ts";
import type { ProfileScene } from "../chart/profileScene.ts";
import type { OpenLevel } from "../entry/LevelTable.tsx";
import { useWorkbench } from "../useWorkbench.ts";
import { DragReadout } from "./DragReadout.tsx";
import { LevelHandle } from "./LevelHandle.tsx";
import "./LevelHandles.css";

interface LevelHandlesProps {
  /** As shown: a preview during a drag. */
  readonly value: Case;
  readonly scene: ProfileScene;
  readonly originMs: number;
  readonly isReadOnly: boolean;
  readonly onOpen: (id: string, form: OpenLevel["form"]) => void;
  readonly onDragging: (isDragging: boolean) => void;
}

/** A handle over each level in sight. They keep their order while one of them is dragged past another. */
export function LevelHandles({ value, scene, originMs, isReadOnly, onOpen, onDragging }: LevelHandlesProps) {
  const settled = useWorkbench((state) => state.open?.value.levels);
  const [held, setHeld] = useState<{ readonly id: string; readonly words: string } | null>(null);
  const hintId = useId();
  if (!settled || settled.length === 0) return null;
  const { fromH, toH } = scene.clock;
  const placed = settled.flatMap((each, i) => {
    const level = value.levels.find(({ id }) => id === each.id) ?? each;
    const atH = (instantMs(level.at) - originMs) / 3_600_000;
    const mgPerL = quantityConvert(level.quantity, "mg/L", value.medicine.molarMass.value);
    const at = { atH, x: scene.clock.x(atH), y: scene.concentration.y(mgPerL * scene.factor) };
    return atH < fromH || atH > toH ? [] : [{ level, place: i + 1, at }];
  });
  const dragged = placed.find(({ level }) => level.id === held?.id);
  return (
    <>
      <svg
        className="level-handles"
        width={scene.width}
        height={scene.height}
        role="group"
        aria-label={dragWords.levels}
      >
        {placed.map(({ level, place, at }) => (
          <LevelHandle
            key={level.id}
            value={value}
            level={level}
            place={place}
            scene={scene}
            {...at}
            hintId={hintId}
            isReadOnly={isReadOnly}
            isHeld={level.id === held?.id}
            onOpen={(form) => onOpen(level.id, form)}
            onWords={(words) => {
              setHeld(words === null ? null : { id: level.id, words });
              onDragging(words !== null);
            }}
          />
        ))}
      </svg>
      {held && dragged && <DragReadout words={held.words} x={dragged.at.x} y={dragged.at.y} width={scene.width} />}
      <span id={hintId} className="visually-hidden">
        {dragWords.levelHint}
      </span>
    </>
  );
}
