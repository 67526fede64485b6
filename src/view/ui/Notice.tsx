import type { ReactNode } from "react";
import { fieldWords } from "../../core/messages/index.ts";
import { Button } from "./Button.tsx";
import { GravityMark, type MarkGravity } from "./GravityMark.tsx";
import "./Notice.css";

export interface NoticeProps {
  readonly gravity: MarkGravity;
  readonly title?: string;
  readonly children: ReactNode;
  readonly onDismiss?: () => void;
  /** "status" is read politely when it appears; leave out for what stands on the page from the start. */
  readonly isAnnounced?: boolean;
}

/** Gravity as a word and a shape; the rule at its side repeats it, colour last. */
export function Notice({ gravity, title, children, onDismiss, isAnnounced = false }: NoticeProps) {
  return (
    <div className={`notice notice-${gravity}`} {...(isAnnounced ? { role: "status" } : {})}>
      <p className="notice-head">
        <span className="notice-word">
          <GravityMark gravity={gravity} /> {fieldWords.gravity[gravity]}
        </span>
        {title ? <strong className="notice-title">{title}</strong> : null}
      </p>
      <div className="notice-body">{children}</div>
      {onDismiss ? (
        <div className="notice-close">
          <Button kind="quiet" onPress={onDismiss} name={title ? `Close: ${title}` : "Close this notice"}>
            Close
          </Button>
        </div>
      ) : null}
    </div>
  );
}
