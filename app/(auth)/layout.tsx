import type { ReactNode } from "react";
import { Deferral } from "@/components/shell/deferral";

export default function AuthLayout({ children }: { children: ReactNode }) {
  return (
    <div className="mx-auto flex min-h-screen max-w-md flex-col px-6 py-16">
      <p className="font-title text-4xl text-deep">Neap</p>
      <main className="mt-8 grow">{children}</main>
      <Deferral />
    </div>
  );
}
