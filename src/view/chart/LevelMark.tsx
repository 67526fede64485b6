import type { ProfileScene } from "./profileScene.ts";

/** Half the width of the plus mark and of the bar's ends, px. */
const ARM = 6;
/** Room a level's figure takes at its right, px. */
const LABEL_ROOM = 48;
/** How far beside the level its forecast and its prediction stand, px, and half the length of their ends. */
const FORECAST_X = -13;
const PREDICTED_X = 9;
const CAP = 3;

interface LevelMarkProps {
  readonly level: ProfileScene["levels"][number];
  /** Right end of the plot, px. */
  readonly right: number;
  /** Pointed at: this patient's prediction is drawn beside it. */
  readonly isLit: boolean;
}

/** A level with the assay's bar; left of it what was forecast before it was known, right of it, when pointed at, what is predicted now. */
export function LevelMark({ level, right, isLit }: LevelMarkProps) {
  const atRight = level.x > right - LABEL_ROOM;
  const kind = level.excluded ? "profile-level profile-level-left-out" : "profile-level";
  const { forecast, predicted } = level;
  return (
    <g className={kind} data-level={level.id}>
      {forecast && (
        <path
          className={`profile-forecast${forecast.held ? "" : " profile-forecast-missed"}`}
          d={interval(level.x + FORECAST_X, forecast.top, forecast.bottom)}
        />
      )}
      {level.top !== null && level.bottom !== null && !level.belowLimit && (
        <line className="profile-bar" x1={level.x} x2={level.x} y1={level.top} y2={level.bottom} />
      )}
      {level.excluded ? (
        <circle className="profile-hollow" cx={level.x} cy={level.y} r={ARM} />
      ) : level.belowLimit ? (
        <path
          className="profile-plus"
          d={`M${level.x - ARM} ${level.y}h${2 * ARM}m${-ARM} 0v${2 * ARM}l-4 -5m4 5l4 -5`}
        />
      ) : (
        <path
          className="profile-plus"
          d={`M${level.x - ARM} ${level.y}h${2 * ARM}M${level.x} ${level.y - ARM}v${2 * ARM}`}
        />
      )}
      {isLit && predicted && (
        <path
          className="profile-predicted"
          d={`${interval(level.x + PREDICTED_X, predicted.top, predicted.bottom)}M${level.x + PREDICTED_X - CAP} ${predicted.y}h${2 * CAP}`}
        />
      )}
      <text
        className={atRight ? "profile-level-value profile-level-value-left" : "profile-level-value"}
        x={atRight ? level.x - 11 : level.x + 11}
        y={level.y - 6}
      >
        {level.label}
      </text>
    </g>
  );
}

/** An upright bar with ends. */
function interval(x: number, top: number, bottom: number): string {
  return `M${x - CAP} ${top}h${2 * CAP}m${-CAP} 0V${bottom}m${-CAP} 0h${2 * CAP}`;
}
