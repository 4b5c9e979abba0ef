import { spawn } from "node:child_process";
import { PlainStop } from "./plain-stop.mjs";
import { endChild } from "./run.mjs";

/** Starts Next.js on loopback and resolves once it answers: { address, child, stop }. */
export async function serve(root, { mode = "start", port, env, quiet = true }) {
  const address = `http://127.0.0.1:${port}`;
  const child = spawn(
    process.execPath,
    ["node_modules/next/dist/bin/next", mode, "-H", "127.0.0.1", "-p", String(port)],
    {
      cwd: root,
      env: { ...process.env, ...env, NEXTAUTH_URL: address },
      stdio: ["ignore", quiet ? "pipe" : "inherit", "inherit"],
    },
  );
  child.stdout?.resume();
  const deadline = Date.now() + 120_000;
  while (Date.now() < deadline && child.exitCode === null && child.signalCode === null) {
    try {
      const answer = await fetch(`${address}/sign-in`, { redirect: "manual" });
      if (answer.status < 500) return { address, child, stop: () => endChild(child) };
    } catch {
      // Not listening yet.
    }
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  await endChild(child);
  throw new PlainStop(`the application did not answer at ${address}; the lines above say why.`);
}
