import { optionStyle } from "../chart/ProfileChart.tsx";

/** An option's letter in its circle: filled when chosen. */
export function OptionBadge({
  id,
  index,
  isChosen,
}: {
  readonly id: string;
  readonly index: number;
  readonly isChosen: boolean;
}) {
  return (
    <span
      className={`lane-badge lane-badge-${optionStyle(index)}${isChosen ? " lane-badge-chosen" : ""}`}
      aria-hidden="true"
    >
      {id}
    </span>
  );
}
