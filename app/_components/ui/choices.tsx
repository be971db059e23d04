import { FieldError, errorId, hintId, type FieldWords } from "@/app/_components/ui/field";
import { classNames } from "@/app/_components/ui/class-names";
import type { ComponentProps, ReactNode } from "react";

type ChoiceInput = Omit<ComponentProps<"input">, "type">;

interface ChoiceProps extends ChoiceInput {
  label: ReactNode;
  /** A line beneath the label. */
  detail?: ReactNode;
}

/** One box to tick. Give it an `id` and the ids of its hints where it stands alone. */
export function Checkbox(props: ChoiceProps) {
  return <Choice type="checkbox" {...props} />;
}

export function Radio(props: ChoiceProps) {
  return <Choice type="radio" {...props} />;
}

function Choice({ label, detail, className, ...input }: ChoiceProps & { type: "checkbox" | "radio" }) {
  return (
    <label className={classNames("choice", className)}>
      <input {...input} />
      <span>
        {label}
        {detail ? <small>{detail}</small> : null}
      </span>
    </label>
  );
}

export interface ChoiceGroupProps extends FieldWords {
  children: ReactNode;
}

/** Several boxes or radios under one legend; `inline` sets them side by side. */
export function ChoiceGroup({ id, label, hint, error, inline, children }: ChoiceGroupProps) {
  const described = [error ? errorId(id) : null, hint ? hintId(id) : null].filter(Boolean).join(" ");
  return (
    <fieldset
      className="choices"
      id={id}
      aria-describedby={described === "" ? undefined : described}
      tabIndex={-1}
    >
      <legend className="choices-legend">{label}</legend>
      <div className={classNames(inline && "choices-in-line")}>{children}</div>
      {hint ? (
        <span className="hint" id={hintId(id)}>
          {hint}
        </span>
      ) : null}
      <FieldError id={id} error={error} />
    </fieldset>
  );
}

export interface RadioOption {
  value: string;
  label: ReactNode;
  detail?: ReactNode;
  disabled?: boolean;
}

/** Radios of one name. Uncontrolled with `defaultValue`; spread a form library's `register` into `input`. */
export function RadioGroup({
  name,
  options,
  defaultValue,
  input,
  ...group
}: Omit<ChoiceGroupProps, "children"> & {
  name: string;
  options: RadioOption[];
  defaultValue?: string;
  input?: Omit<ChoiceInput, "value" | "name">;
}) {
  return (
    <ChoiceGroup {...group}>
      {options.map((option) => (
        <Radio
          key={option.value}
          {...input}
          name={name}
          value={option.value}
          label={option.label}
          detail={option.detail}
          disabled={option.disabled ?? input?.disabled}
          defaultChecked={defaultValue === undefined ? undefined : option.value === defaultValue}
          aria-invalid={group.error ? true : undefined}
        />
      ))}
    </ChoiceGroup>
  );
}
