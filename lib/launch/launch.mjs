import { ensureBuild } from "./build.mjs";
import { isFree, nextFreePort } from "./free-port.mjs";
import { PlainStop } from "./plain-stop.mjs";
import { ROOT, isDemo, prepare } from "./prepare.mjs";
import { serve } from "./serve.mjs";

/** The port asked for, or the first free one from 3000 on. */
export async function choosePort(asked = process.env.PORT) {
  if (!asked) return nextFreePort(3000);
  const port = Number(asked);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) {
    throw new PlainStop(`PORT=${asked} is not a port; choose a number from 1 to 65535.`);
  }
  if (!(await isFree(port))) {
    throw new PlainStop(`port ${port} is in use; choose another with PORT=… npm start.`);
  }
  return port;
}

/** Resolves when a signal arrives, the parent goes away or the child ends by itself. */
function untilStopped(child) {
  const parent = process.ppid;
  return new Promise((resolve) => {
    const watch = setInterval(() => process.ppid !== parent && end("parent"), 1000);
    const end = (why) => {
      clearInterval(watch);
      resolve(why);
    };
    for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => end(signal));
    child.once("exit", () => end("exit"));
  });
}

/** Sets everything up, serves until stopped, and stops what it started. */
export async function launch(mode) {
  const port = await choosePort();
  const { env, stop } = await prepare();
  try {
    if (mode === "start") await ensureBuild(ROOT);
    const app = await serve(ROOT, { mode, port, env, quiet: mode === "start" });
    console.log(`\nNeap is ready at ${app.address}`);
    if (isDemo()) {
      console.log("Demo accounts, password neap-demo:");
      console.log("  admin@ engineer@ manager@ liaison@saltmarsh.example");
      console.log("  admin@fenwick.example (a second team, which sees nothing of the first)");
    }
    console.log("Ctrl-C stops it.");
    const why = await untilStopped(app.child);
    await app.stop();
    return why === "exit" ? 1 : 0;
  } finally {
    await stop();
  }
}
