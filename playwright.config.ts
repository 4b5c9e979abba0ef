import { defineConfig } from "@playwright/test";

export default defineConfig({
  testDir: "tests/browser",
  workers: 1,
  retries: 0,
  timeout: 180_000,
  // Machines are shared and slow at times; what comes late is still right.
  expect: { timeout: 15_000 },
  use: {
    baseURL: process.env.NEAP_ADDRESS,
    trace: "off",
    launchOptions: {
      executablePath: "/usr/bin/chromium",
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
      ],
    },
  },
});
