import { type PointerEvent, useEffect, useRef } from "react";

/** Along the clock (right is later), or up and down (up is more). */
export type DragAxis = "clock" | "amount";

export interface AxisDrag {
  /** The ways it can go. A drag goes the way it was first moved and no other: a time and an amount never change together. */
  readonly axes: readonly DragAxis[];
  /** Shows it at `px` from where it was taken: to the right, or up. */
  readonly onMove: (axis: DragAxis, px: number, isFine: boolean) => void;
  readonly onDrop: (axis: DragAxis, px: number, isFine: boolean) => void;
  readonly onCancel: () => void;
  /** Pressed and released without moving. */
  readonly onPress: () => void;
}

/** Movement below this is a press, px. */
const THRESHOLD = 3;

/** Drag with any pointer, on one axis: one drag is one edit, made on release; Escape cancels it and nothing is left. Alt makes the step finer. */
export function useAxisDrag(drag: AxisDrag) {
  const active = useRef<{ axis: DragAxis | null; end: () => void } | null>(null);
  useEffect(() => () => active.current?.end(), []);
  return (event: PointerEvent<SVGGElement>) => {
    if (event.button !== 0 || active.current) return;
    const target = event.currentTarget;
    const pointer = event.pointerId;
    const { clientX, clientY } = event;
    target.setPointerCapture(pointer);
    const gone = (next: globalThis.PointerEvent, axis: DragAxis) =>
      axis === "clock" ? next.clientX - clientX : clientY - next.clientY;
    const isOther = (next: globalThis.PointerEvent) => next.pointerId !== pointer;
    const move = (next: globalThis.PointerEvent) => {
      const current = active.current;
      if (!current || isOther(next)) return;
      current.axis ??= firstMoved(drag.axes, (axis) => Math.abs(gone(next, axis)));
      if (current.axis) drag.onMove(current.axis, gone(next, current.axis), next.altKey);
    };
    const up = (next: globalThis.PointerEvent) => {
      if (isOther(next)) return;
      const axis = active.current?.axis ?? null;
      end();
      if (axis) drag.onDrop(axis, gone(next, axis), next.altKey);
      else drag.onPress();
    };
    const cancel = () => {
      end();
      drag.onCancel();
    };
    const cancelled = (next: globalThis.PointerEvent) => {
      if (!isOther(next)) cancel();
    };
    const key = (next: KeyboardEvent) => {
      if (next.key !== "Escape") return;
      next.preventDefault();
      next.stopPropagation();
      cancel();
    };
    // On the window: a mark that changes its place among its neighbours is taken out of the page for a moment and loses its capture.
    const end = () => {
      active.current = null;
      window.removeEventListener("pointermove", move);
      window.removeEventListener("pointerup", up);
      window.removeEventListener("pointercancel", cancelled);
      window.removeEventListener("keydown", key, true);
      if (target.hasPointerCapture(pointer)) target.releasePointerCapture(pointer);
    };
    active.current = { axis: null, end };
    window.addEventListener("pointermove", move);
    window.addEventListener("pointerup", up);
    window.addEventListener("pointercancel", cancelled);
    window.addEventListener("keydown", key, true);
  };
}

/** The axis it has gone further along; null while it has hardly moved. */
function firstMoved(axes: readonly DragAxis[], distance: (axis: DragAxis) => number): DragAxis | null {
  const [furthest] = [...axes].sort((a, b) => distance(b) - distance(a));
  return furthest !== undefined && distance(furthest) >= THRESHOLD ? furthest : null;
}
