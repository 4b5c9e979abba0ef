"use client";

import { signOut } from "next-auth/react";

export function SignOutButton() {
  return (
    <button
      type="button"
      className="cursor-pointer py-1 text-sm text-deep underline"
      onClick={() => signOut({ callbackUrl: "/sign-in" })}
    >
      Sign out
    </button>
  );
}
