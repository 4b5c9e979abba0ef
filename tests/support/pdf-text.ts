import { spawnSync } from "node:child_process";

/** Text of each page of a PDF as pdftotext, a Debian package, finds it. */
export function readPdfText(bytes: Uint8Array): string[] {
  const { status, stdout, stderr } = spawnSync("pdftotext", ["-layout", "-", "-"], {
    input: bytes,
    encoding: "utf8",
    maxBuffer: 1 << 26,
  });
  if (status !== 0) throw new Error(stderr);
  return stdout.split("\f").slice(0, -1);
}
