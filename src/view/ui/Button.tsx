import type { ReactNode } from "react";
import { Button as AriaButton } from "react-aria-components";
import "./Button.css";

export interface ButtonProps {
  readonly children: ReactNode;
  readonly onPress?: () => void;
  /** "main": the one thing to do here; "quiet": text only; "grave": can't be undone with one key. */
  readonly kind?: "main" | "plain" | "quiet" | "grave";
  readonly type?: "button" | "submit";
  readonly isDisabled?: boolean;
  /** Full name for a screen reader when the words on the button don't say what it acts on; begins with those words. */
  readonly name?: string;
  readonly hasInitialFocus?: boolean;
}

export function Button({
  children,
  onPress,
  kind = "plain",
  type = "button",
  isDisabled = false,
  name,
  hasInitialFocus,
}: ButtonProps) {
  return (
    <AriaButton
      className={`button button-${kind}`}
      type={type}
      isDisabled={isDisabled}
      {...(onPress ? { onPress } : {})}
      {...(name ? { "aria-label": name } : {})}
      {...(hasInitialFocus ? { autoFocus: true } : {})}
    >
      {children}
    </AriaButton>
  );
}
