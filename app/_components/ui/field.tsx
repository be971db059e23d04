import { Mark } from "@/app/_components/ui/mark";
import { classNames } from "@/app/_components/ui/class-names";
import type { ReactNode } from "react";

export interface FieldWords {
  /** Of the control; the hint's and the error's ids follow from it. */
  id: string;
  label: ReactNode;
  hint?: ReactNode;
  /** What needs fixing, in words; its presence marks the control. */
  error?: ReactNode;
  /** Label beside the control, as in a row of filters. */
  inline?: boolean;
}

/** Label, hint and error round one control, which takes `fieldAria` of the same words. */
export function Field({ id, label, hint, error, inline, children }: FieldWords & { children: ReactNode }) {
  return (
    <div className={classNames(inline ? "field-inline" : "field")}>
      <label className="field-label" htmlFor={id}>
        {label}
      </label>
      {children}
      {hint ? (
        <span className="hint" id={hintId(id)}>
          {hint}
        </span>
      ) : null}
      <FieldError id={id} error={error} />
    </div>
  );
}

export function FieldError({ id, error }: Pick<FieldWords, "id" | "error">) {
  if (!error) return null;
  return (
    <span className="field-error" id={errorId(id)}>
      <Mark mark="fix" /> <span>{error}</span>
    </span>
  );
}

/** Ties a control to its hint and error, and says that it needs fixing. */
export function fieldAria({ id, hint, error }: Pick<FieldWords, "id" | "hint" | "error">) {
  const described = [error ? errorId(id) : null, hint ? hintId(id) : null].filter(Boolean).join(" ");
  return {
    id,
    "aria-describedby": described === "" ? undefined : described,
    "aria-invalid": error ? (true as const) : undefined,
  };
}

export function hintId(id: string): string {
  return `${id}-hint`;
}

export function errorId(id: string): string {
  return `${id}-error`;
}
