import { spawn } from "node:child_process";

/** Runs a program to its end. Resolves to { code, output }; output only when captured. */
export function run(command, args, { capture = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: capture ? ["ignore", "pipe", "pipe"] : ["ignore", "inherit", "inherit"],
      ...options,
    });
    let output = "";
    child.stdout?.on("data", (chunk) => (output += chunk));
    child.stderr?.on("data", (chunk) => (output += chunk));
    child.on("error", reject);
    child.on("close", (code, signal) => resolve({ code: code ?? (signal ? 1 : 0), output }));
  });
}

/** Runs a file of TypeScript through tsx. */
export function runTypeScript(file, env, options = {}) {
  return run(process.execPath, ["--import", "tsx", file], {
    env: { ...process.env, ...env },
    ...options,
  });
}

/** Ends a child that this process started: politely, then after ten seconds for good. */
export function endChild(child) {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
  return new Promise((resolve) => {
    const timer = setTimeout(() => child.kill("SIGKILL"), 10_000);
    child.once("exit", () => {
      clearTimeout(timer);
      resolve();
    });
    child.kill("SIGTERM");
  });
}
