"use client";

import { useEffect, useId, useRef, type ReactNode } from "react";
import { primitiveWords } from "@/lib/strings/frame";
import { Button } from "@/app/_components/ui/button";

export interface DialogProps {
  open: boolean;
  title: ReactNode;
  /** Called by Escape, by "Close", and when a form inside closes it. */
  onClose: () => void;
  children: ReactNode;
}

/** The browser's own dialog: it keeps the focus inside and gives it back. */
export function Dialog({ open, title, onClose, children }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (open && !element.open) element.showModal();
    if (!open && element.open) element.close();
  }, [open]);

  return (
    <dialog className="dialog" ref={dialog} aria-labelledby={titleId} onClose={onClose}>
      <div className="dialog-head">
        <h2 id={titleId}>{title}</h2>
        <Button look="text" onClick={onClose}>
          {primitiveWords.close}
        </Button>
      </div>
      {open ? children : null}
    </dialog>
  );
}
