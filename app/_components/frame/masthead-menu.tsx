"use client";

import { useId, useRef, useState, type KeyboardEvent, type ReactNode } from "react";
import { frameWords } from "@/lib/strings/frame";
import { classNames } from "@/app/_components/ui/class-names";

/** Folds the masthead's links behind a button on phones; wider pages show them and no button. */
export function MastheadMenu({ children }: { children: ReactNode }) {
  const [open, setOpen] = useState(false);
  const button = useRef<HTMLButtonElement>(null);
  const id = useId();

  function onKeyDown(event: KeyboardEvent) {
    if (event.key !== "Escape" || !open) return;
    setOpen(false);
    button.current?.focus();
  }

  return (
    <>
      <button
        className="btn menu-button"
        type="button"
        ref={button}
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen(!open)}
        onKeyDown={onKeyDown}
      >
        {open ? frameWords.closeMenu : frameWords.menu}
      </button>
      <div
        className={classNames("masthead-menu", open && "masthead-menu-open")}
        id={id}
        onKeyDown={onKeyDown}
      >
        {children}
      </div>
    </>
  );
}
