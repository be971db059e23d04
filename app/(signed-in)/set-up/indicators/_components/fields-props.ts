import type { FieldErrors, UseFormRegister } from "react-hook-form";
import type { IndicatorFormValues } from "./indicator-form";

/** What every group of the form's fields is given. */
export interface FieldsProps {
  register: UseFormRegister<IndicatorFormValues>;
  errors: FieldErrors<IndicatorFormValues>;
  isNew: boolean;
  /** Counts exist: kind and shared denominator are fixed. */
  isCounted: boolean;
}
