import { classNames } from "@/app/_components/ui/class-names";
import { Field, fieldAria, type FieldWords } from "@/app/_components/ui/field";
import type { ComponentProps } from "react";

export type TextInputProps = FieldWords & Omit<ComponentProps<"input">, "id"> & { numeric?: boolean };

/** A labelled one-line box. `numeric` aligns figures right and asks phones for their number keys. */
export function TextInput({ id, label, hint, error, inline, numeric, className, ...rest }: TextInputProps) {
  return (
    <Field id={id} label={label} hint={hint} error={error} inline={inline}>
      <input
        type="text"
        inputMode={numeric ? "numeric" : undefined}
        {...rest}
        {...fieldAria({ id, hint, error })}
        className={classNames("input", numeric && "input-number", className)}
      />
    </Field>
  );
}
