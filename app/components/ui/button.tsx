import type { ComponentProps } from "react";
import { Link } from "react-router";

export type ButtonLook = "primary" | "plain" | "quiet" | "danger";

const looks: Record<ButtonLook, string> = {
  primary: "bg-ink text-white border-ink hover:bg-grey-800",
  plain: "bg-white text-ink border-ink hover:bg-grey-100",
  quiet: "bg-transparent text-ink border-transparent hover:bg-grey-100",
  danger: "bg-white text-warning border-warning hover:bg-warning hover:text-white",
};

/** The classes of a button, for elements that only look like one. */
export function buttonClass(look: ButtonLook = "plain", small = false): string {
  const size = small ? "min-h-8 px-2.5 text-sm" : "min-h-11 px-4 text-base";
  return `inline-flex items-center justify-center gap-2 rounded-sm border font-display font-semibold whitespace-nowrap disabled:opacity-50 ${size} ${looks[look]}`;
}

type Look = { look?: ButtonLook; small?: boolean };

export function Button({
  look,
  small,
  className = "",
  type = "button",
  ...rest
}: ComponentProps<"button"> & Look) {
  return <button type={type} className={`${buttonClass(look, small)} ${className}`} {...rest} />;
}

export function ButtonLink({ look, small, className = "", ...rest }: ComponentProps<typeof Link> & Look) {
  return <Link className={`${buttonClass(look, small)} ${className}`} {...rest} />;
}
