import { launch } from "./launch.mjs";
import { runMain } from "./plain-stop.mjs";

await runMain(() => launch("dev"));
