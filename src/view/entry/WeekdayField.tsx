import { useId } from "react";
import { doseWords, weekdayName } from "../../core/messages/index.ts";
import "./WeekdayField.css";

export interface WeekdayFieldProps {
  /** 1 for Monday to 7 for Sunday, ascending; undefined: every day. */
  readonly value: readonly number[] | undefined;
  readonly fault?: string | undefined;
  /** Ascending; undefined when none is left. */
  readonly onChange: (weekdays: number[] | undefined) => void;
}

const DAYS = [1, 2, 3, 4, 5, 6, 7] as const;

/** The weekdays of a clock repeat as seven marks; none marked is every day. */
export function WeekdayField({ value, fault, onChange }: WeekdayFieldProps) {
  const helpId = useId();
  const toggle = (day: number) => {
    const next = DAYS.filter((each) => (each === day) !== (value ?? []).includes(each));
    onChange(next.length > 0 ? next : undefined);
  };
  return (
    <fieldset className="weekday-field" aria-describedby={helpId}>
      <legend className="weekday-field-label">{doseWords.weekdays}</legend>
      <div className="weekday-field-days">
        {DAYS.map((day) => (
          <label key={day} className="weekday-field-day">
            <input
              type="checkbox"
              checked={value?.includes(day) ?? false}
              onChange={() => toggle(day)}
              aria-label={weekdayName(day)}
            />
            {weekdayName(day, "short")}
          </label>
        ))}
      </div>
      <p id={helpId} className="field-frame-description">
        {doseWords.weekdaysHelp}
      </p>
      {fault ? (
        <p className="field-frame-fault" role="status">
          {fault}
        </p>
      ) : null}
    </fieldset>
  );
}
