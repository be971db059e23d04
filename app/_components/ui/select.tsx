import { classNames } from "@/app/_components/ui/class-names";
import { Field, fieldAria, type FieldWords } from "@/app/_components/ui/field";
import type { ComponentProps } from "react";

export type SelectProps = FieldWords & Omit<ComponentProps<"select">, "id">;

/** Options are its children. */
export function Select({ id, label, hint, error, inline, className, ...rest }: SelectProps) {
  return (
    <Field id={id} label={label} hint={hint} error={error} inline={inline}>
      <select {...rest} {...fieldAria({ id, hint, error })} className={classNames("input", className)} />
    </Field>
  );
}
