import type { ButtonHTMLAttributes } from "react";

export function Button({ className = "", ...props }: ButtonHTMLAttributes<HTMLButtonElement>) {
  return (
    <button
      className={`min-h-10 cursor-pointer rounded-sm border border-deep bg-deep px-4 font-medium text-paper transition-colors hover:border-ink hover:bg-ink disabled:cursor-wait disabled:opacity-60 ${className}`}
      {...props}
    />
  );
}
