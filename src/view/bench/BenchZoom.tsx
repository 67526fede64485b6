import type { Analysis } from "../../core/analysis/index.ts";
import { benchWords } from "../../core/messages/index.ts";
import { Button } from "../ui/Button.tsx";
import { type BenchSpan, spanHas, spanMoved, spanZoomed } from "./benchSpan.ts";

interface BenchZoomProps {
  /** Both null while there is no analysis: nothing to move. */
  readonly clock: Analysis["clock"] | null;
  readonly span: BenchSpan | null;
  readonly onSpan: (span: BenchSpan) => void;
}

/** Which part of the clock is shown: closer and wider about now, or about the middle where now is not shown. */
export function BenchZoom({ clock, span, onSpan }: BenchZoomProps) {
  const zoom = (factor: number) => {
    if (!clock || !span) return;
    const around = spanHas(span, clock.nowH) ? clock.nowH : (span.fromH + span.toH) / 2;
    onSpan(spanZoomed(clock, span, factor, around));
  };
  const move = (share: number) => clock && span && onSpan(spanMoved(clock, span, share));
  return (
    <div className="bench-zoom" role="group" aria-label="Part of the clock shown">
      <Button kind="quiet" onPress={() => zoom(0.6)}>
        {benchWords.closer}
      </Button>
      <Button kind="quiet" onPress={() => zoom(1 / 0.6)}>
        {benchWords.wider}
      </Button>
      <Button kind="quiet" onPress={() => move(-0.4)}>
        {benchWords.earlier}
      </Button>
      <Button kind="quiet" onPress={() => move(0.4)}>
        {benchWords.later}
      </Button>
    </div>
  );
}
