import { Link } from "@/app/_components/ui/link";
import { classNames } from "@/app/_components/ui/class-names";
import type { ComponentProps } from "react";

export type ButtonLook = "plain" | "primary" | "text";

const lookClass: Record<ButtonLook, string | false> = {
  plain: false,
  primary: "btn-primary",
  text: "btn-text",
};

export function Button({
  look = "plain",
  className,
  ...rest
}: ComponentProps<"button"> & { look?: ButtonLook }) {
  return <button type="button" {...rest} className={classNames("btn", lookClass[look], className)} />;
}

export function ButtonLink({
  look = "plain",
  className,
  ...rest
}: ComponentProps<typeof Link> & { look?: ButtonLook }) {
  return <Link {...rest} className={classNames("btn", lookClass[look], className)} />;
}
