import { classNames } from "@/app/_components/ui/class-names";
import { Field, fieldAria, type FieldWords } from "@/app/_components/ui/field";
import type { ComponentProps } from "react";

export type TextAreaProps = FieldWords & Omit<ComponentProps<"textarea">, "id">;

export function TextArea({ id, label, hint, error, inline, className, ...rest }: TextAreaProps) {
  return (
    <Field id={id} label={label} hint={hint} error={error} inline={inline}>
      <textarea
        rows={3}
        {...rest}
        {...fieldAria({ id, hint, error })}
        className={classNames("input", className)}
      />
    </Field>
  );
}
