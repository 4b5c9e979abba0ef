import Link from "next/link";
import type { ButtonHTMLAttributes, ComponentProps } from "react";

const SHAPE =
  "inline-flex min-h-10 cursor-pointer items-center justify-center rounded-sm border px-4 font-medium transition-colors disabled:cursor-wait disabled:opacity-60";

const LOOKS = {
  primary: "border-deep bg-deep text-paper hover:border-ink hover:bg-ink",
  quiet: "border-ink-soft bg-sheet text-ink hover:border-deep hover:text-deep",
};
type Look = keyof typeof LOOKS;

export function Button({
  className = "",
  look = "primary",
  type = "button",
  ...props
}: ButtonHTMLAttributes<HTMLButtonElement> & { look?: Look }) {
  return <button type={type} className={`${SHAPE} ${LOOKS[look]} ${className}`} {...props} />;
}

/** A link that looks like a button: it goes somewhere, it changes nothing. */
export function ButtonLink({
  className = "",
  look = "quiet",
  ...props
}: ComponentProps<typeof Link> & { look?: Look }) {
  return <Link className={`${SHAPE} no-underline ${LOOKS[look]} ${className}`} {...props} />;
}
