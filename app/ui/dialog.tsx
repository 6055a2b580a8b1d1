import { type ReactNode, useEffect, useId, useRef } from "react";
import { uiText } from "~/text/en/ui";
import { Button } from "./button";

interface DialogProps {
  open: boolean;
  /** Escape, the close button, or a press beside it. */
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Buttons, the main one first; they wrap on a narrow screen. */
  actions?: ReactNode;
}

/** Something to do without leaving the page: the browser's own dialog keeps the focus inside. */
export function Dialog({ open, onClose, title, children, actions }: DialogProps) {
  return (
    <DialogBox open={open} onClose={onClose} title={title} lightDismiss>
      <div className="mt-3">{children}</div>
      <div className="mt-6 flex flex-wrap gap-3">
        {actions}
        <Button onClick={onClose}>{uiText.close}</Button>
      </div>
    </DialogBox>
  );
}

/** A question that must be answered: says what follows, and leaves by its own buttons or Escape. */
export function AlertDialog({
  open,
  onClose,
  title,
  children,
  actions,
}: Omit<DialogProps, "actions"> & { actions: ReactNode }) {
  return (
    <DialogBox open={open} onClose={onClose} title={title} role="alertdialog">
      <div className="mt-3">{children}</div>
      <div className="mt-6 flex flex-wrap gap-3">{actions}</div>
    </DialogBox>
  );
}

function DialogBox({
  open,
  onClose,
  title,
  role,
  lightDismiss = false,
  children,
}: Omit<DialogProps, "actions"> & { role?: "alertdialog"; lightDismiss?: boolean }) {
  const box = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  const bodyId = useId();
  useEffect(() => {
    const dialog = box.current;
    if (open) dialog?.showModal();
    return () => dialog?.close();
  }, [open]);
  return (
    // biome-ignore lint/a11y/useKeyWithClickEvents: the keyboard's way out is Escape, which the element handles
    <dialog
      ref={box}
      role={role}
      aria-labelledby={titleId}
      aria-describedby={role ? bodyId : undefined}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={lightDismiss ? (event) => event.target === box.current && onClose() : undefined}
      className="m-auto max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] max-w-lg overflow-y-auto rounded-lg border-2 border-ink bg-card p-0 text-ink backdrop:bg-shade"
    >
      <div className="p-5 sm:p-6">
        <h2 id={titleId} className="text-xl font-bold">
          {title}
        </h2>
        <div id={bodyId}>{children}</div>
      </div>
    </dialog>
  );
}
