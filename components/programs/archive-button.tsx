"use client";

import { useRouter } from "next/navigation";
import { ConfirmButton } from "@/components/ui/confirm-button";
import type { Outcome } from "./outcome";

interface ArchiveButtonProps {
  subject: "program" | "build";
  name: string;
  action: () => Promise<Outcome>;
  /** Where to go afterwards. */
  href: string;
}

const CONSEQUENCE = {
  program: "It leaves the lists with its builds. Nothing is deleted, and it can be restored.",
  build: "It leaves the lists and the trend. Its sweeps stay, and it can be restored.",
};

export function ArchiveButton({ subject, name, action, href }: ArchiveButtonProps) {
  const router = useRouter();
  return (
    <ConfirmButton
      label={`Archive this ${subject}`}
      title={`Archive ${name}?`}
      confirmLabel="Archive"
      action={action}
      onDone={() => router.push(href)}
    >
      {CONSEQUENCE[subject]}
    </ConfirmButton>
  );
}
