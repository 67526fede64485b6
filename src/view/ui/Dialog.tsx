import type { ReactNode } from "react";
import { Dialog as AriaDialog, Heading, Modal, ModalOverlay } from "react-aria-components";
import { Button } from "./Button.tsx";
import "./Dialog.css";

export interface DialogProps {
  readonly title: string;
  readonly isOpen: boolean;
  /** Called by Escape and by the close button. */
  readonly onClose: () => void;
  readonly children: ReactNode;
  /** "side": a drawer at the right edge, for panels; "centre": a question or a short form. */
  readonly place?: "centre" | "side";
  /** A question that has to be answered before anything else. */
  readonly isAlert?: boolean;
  readonly closeWord?: string;
}

export function Dialog({
  title,
  isOpen,
  onClose,
  children,
  place = "centre",
  isAlert = false,
  closeWord = "Close",
}: DialogProps) {
  return (
    <ModalOverlay
      className={`dialog-overlay dialog-overlay-${place}`}
      isOpen={isOpen}
      onOpenChange={(open) => !open && onClose()}
    >
      <Modal className={`dialog dialog-${place}`}>
        <AriaDialog className="dialog-body" role={isAlert ? "alertdialog" : "dialog"}>
          <header className="dialog-head">
            <Heading slot="title" level={2} className="dialog-title">
              {title}
            </Heading>
            {isAlert ? null : (
              <Button kind="quiet" onPress={onClose}>
                {closeWord}
              </Button>
            )}
          </header>
          {children}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
