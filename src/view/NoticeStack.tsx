import { issueMessage, recordWords } from "../core/messages/index.ts";
import "./NoticeStack.css";
import { Button } from "./ui/Button.tsx";
import { Notice } from "./ui/Notice.tsx";
import { useWorkbench } from "./useWorkbench.ts";

/** Refusals and warnings from outside a form. They stay until they are closed. */
export function NoticeStack() {
  const notices = useWorkbench((state) => state.notices);
  const dismiss = useWorkbench((state) => state.dismiss);
  const undoNotice = useWorkbench((state) => state.undoNotice);
  return (
    <section className="notice-stack" aria-label="Notices" aria-live="polite">
      {notices.map((notice) => (
        <Notice key={notice.id} gravity={notice.gravity} onDismiss={() => dismiss(notice.id)}>
          {notice.issues.map((issue, i) => (
            <p key={i}>{issueMessage(issue)}</p>
          ))}
          {notice.undo ? (
            <div>
              <Button onPress={() => void undoNotice(notice.id)}>{recordWords.undo}</Button>
            </div>
          ) : null}
        </Notice>
      ))}
    </section>
  );
}
