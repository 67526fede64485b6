import "./GravityMark.css";

export type MarkGravity = "stop" | "check" | "note";

const SHAPES: Readonly<Record<MarkGravity, string>> = {
  stop: "M5 1h6l4 4v6l-4 4H5l-4-4V5z",
  check: "M8 1.2 15.2 14.6H.8z",
  note: "M1.5 1.5h13v13h-13z",
};

/** A shape a gravity: octagon, triangle, square. Decorative: the word beside it carries the meaning. */
export function GravityMark({ gravity }: { readonly gravity: MarkGravity }) {
  return (
    <svg className={`gravity-mark gravity-mark-${gravity}`} viewBox="0 0 16 16" aria-hidden="true" focusable="false">
      <path className="gravity-mark-shape" d={SHAPES[gravity]} />
      <path className="gravity-mark-sign" d={gravity === "note" ? "M8 4v1.8M8 7.4V12" : "M8 4.6v4.6M8 10.8v1.4"} />
    </svg>
  );
}
