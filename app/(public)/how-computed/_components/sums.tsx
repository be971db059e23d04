import type { ReactNode } from "react";
import { howComputedWords } from "@/lib/strings/how-computed";

/** One step with its number, what is worked out and why. */
export function Step({ title, text, children }: { title: string; text: string; children?: ReactNode }) {
  return (
    <li>
      <h2>{title}</h2>
      {children ? <div className="sum">{children}</div> : null}
      <p className="hint">{text}</p>
    </li>
  );
}

export function Fraction({ top, bottom }: { top: ReactNode; bottom: ReactNode }) {
  return (
    <span className="fraction">
      <span>{top}</span>
      <span>{bottom}</span>
    </span>
  );
}

/** Italic: worked out, not entered. */
export function WorkedOut({ children }: { children: ReactNode }) {
  return <span className="worked-out">{children}</span>;
}

export function SquareRoot({ children }: { children: ReactNode }) {
  return (
    <>
      <span>{howComputedWords.spread.square}</span>
      {children}
    </>
  );
}
