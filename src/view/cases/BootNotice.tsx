import { bootWords } from "../../core/messages/index.ts";
import { instantText } from "../../core/time/index.ts";
import type { WorkbenchState } from "../../shell/store/workbenchState.ts";
import { Button } from "../ui/Button.tsx";
import { FilePicker } from "../ui/FilePicker.tsx";
import { Notice } from "../ui/Notice.tsx";

export interface BootNoticeProps {
  readonly boot: WorkbenchState["boot"];
  /** Zone in which the time of the last save is said. */
  readonly zone: string;
  readonly onAcceptLoss: () => void;
  readonly onBackup: (file: File) => void;
  readonly onReload: () => void;
}

/** What has to be said about the store before anything else; nothing when it is ready. */
export function BootNotice({ boot, zone, onAcceptLoss, onBackup, onReload }: BootNoticeProps) {
  switch (boot.kind) {
    case "ready":
      return null;
    case "opening":
      return <p role="status">{bootWords.opening}</p>;
    case "lost": {
      const when = boot.lastSavedAt === null ? null : instantText(boot.lastSavedAt, zone, "full");
      return (
        <Notice gravity="stop" title={bootWords.lostTitle[boot.extent]} isAnnounced>
          <p>
            {bootWords.lostWhy[boot.extent]} {boot.cases === null ? null : bootWords.lostCount(boot.cases, when)}{" "}
            {boot.recoverable > 0 ? bootWords.lostRecoverable(boot.recoverable) : null}
          </p>
          <p>{bootWords.lostWhatToDo}</p>
          <div className="cases-screen-actions">
            <FilePicker kind="main" word={bootWords.lostImport} endings={[".json"]} onFile={onBackup} />
            <Button kind="grave" onPress={onAcceptLoss}>
              {bootWords.lostAccept}
            </Button>
          </div>
        </Notice>
      );
    }
    case "newer":
      return (
        <Notice gravity="check" title={bootWords.newerTitle} isAnnounced>
          <p>{bootWords.newer(boot.found, boot.known, boot.readable)}</p>
          <div>
            <Button onPress={onReload}>{bootWords.reload}</Button>
          </div>
        </Notice>
      );
    case "blocked":
      return (
        <Notice gravity="stop" title={bootWords.blockedTitle} isAnnounced>
          <p>{bootWords.blocked}</p>
          <div>
            <Button onPress={onReload}>{bootWords.reload}</Button>
          </div>
        </Notice>
      );
    case "unavailable":
      return (
        <Notice gravity="stop" title={bootWords.unavailableTitle} isAnnounced>
          <p>{bootWords.unavailable(boot.detail)}</p>
        </Notice>
      );
  }
}
