import { type PointerEvent, useEffect, useRef } from "react";

export interface TokenDrag {
  /** Shows the token at `dx` px from where it was taken. */
  readonly onMove: (dx: number, isFine: boolean) => void;
  readonly onDrop: (dx: number, isFine: boolean) => void;
  readonly onCancel: () => void;
  /** Pressed and released without moving. */
  readonly onPress: () => void;
}

/** Movement below this is a press, px. */
const THRESHOLD = 3;

/**
 * Drag along the clock with any pointer: one drag is one edit, made on release; Escape cancels it and nothing is left.
 * Alt makes the step finer.
 */
export function useTokenDrag(drag: TokenDrag) {
  const active = useRef<{ startX: number; moved: boolean; end: () => void } | null>(null);
  useEffect(() => () => active.current?.end(), []);
  return (event: PointerEvent<SVGGElement>) => {
    if (event.button !== 0 || active.current) return;
    const target = event.currentTarget;
    const pointer = event.pointerId;
    const startX = event.clientX;
    target.setPointerCapture(pointer);
    const move = (next: globalThis.PointerEvent) => {
      const current = active.current;
      if (!current) return;
      const dx = next.clientX - startX;
      if (!current.moved && Math.abs(dx) < THRESHOLD) return;
      current.moved = true;
      drag.onMove(dx, next.altKey);
    };
    const up = (next: globalThis.PointerEvent) => {
      const moved = active.current?.moved ?? false;
      end();
      if (moved) drag.onDrop(next.clientX - startX, next.altKey);
      else drag.onPress();
    };
    const cancel = () => {
      end();
      drag.onCancel();
    };
    const key = (next: KeyboardEvent) => {
      if (next.key !== "Escape") return;
      next.preventDefault();
      cancel();
    };
    const end = () => {
      active.current = null;
      target.removeEventListener("pointermove", move);
      target.removeEventListener("pointerup", up);
      target.removeEventListener("pointercancel", cancel);
      window.removeEventListener("keydown", key, true);
      if (target.hasPointerCapture(pointer)) target.releasePointerCapture(pointer);
    };
    active.current = { startX, moved: false, end };
    target.addEventListener("pointermove", move);
    target.addEventListener("pointerup", up);
    target.addEventListener("pointercancel", cancel);
    window.addEventListener("keydown", key, true);
  };
}
