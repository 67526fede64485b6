import { Component, type ReactNode } from "react";
import type { Workbench } from "../shell/store/createWorkbench.ts";
import { fileSave } from "../view/ui/fileSave.ts";
import "./ErrorBoundary.css";

const words = {
  title: "Ebbline has stopped on this screen",
  saved: "The open case is stored on this device as you last saw it.",
  unsaved: "The open case has changes that are not stored yet. Export it before you reload.",
  noCase: "No case was open. What is stored on this device is not touched.",
  exportCase: "Export the open case",
  reload: "Reload",
  detail: "What went wrong, for whoever mends it:",
} as const;

interface ErrorBoundaryProps {
  /** null: the program failed before there was a store. */
  readonly workbench: Workbench | null;
  readonly children: ReactNode;
}

/** A screen that fails takes only itself down: the store goes on saving, and the case can be exported from here. */
export class ErrorBoundary extends Component<ErrorBoundaryProps, { readonly error: unknown }> {
  override state: { readonly error: unknown } = { error: null };

  static getDerivedStateFromError(error: unknown) {
    return { error: error ?? new Error("unknown") };
  }

  override render(): ReactNode {
    const { error } = this.state;
    return error === null ? this.props.children : <Stopped error={error} workbench={this.props.workbench} />;
  }
}

/** Plain elements only: whatever failed may be in the components the screens are made of. */
export function Stopped({ error, workbench }: { readonly error: unknown; readonly workbench: Workbench | null }) {
  const open = workbench?.getState().open ?? null;
  const isSaved = open?.saving.status === "saved" || open?.saving.status === "read-only";
  const exportCase = () => {
    const file = workbench?.getState().exportFile();
    if (file) fileSave(file.name, file.text);
  };
  return (
    <main className="stopped" role="alert">
      <h1>{words.title}</h1>
      <p>{open ? (isSaved ? words.saved : words.unsaved) : words.noCase}</p>
      <p className="stopped-actions">
        {open ? (
          <button type="button" onClick={exportCase}>
            {words.exportCase}
          </button>
        ) : null}
        <button type="button" onClick={() => location.reload()}>
          {words.reload}
        </button>
      </p>
      <p>{words.detail}</p>
      <pre>{String(error)}</pre>
    </main>
  );
}
