import { defineConfig } from "@playwright/test";

const PORT = 3417;
const ADDRESS = `http://127.0.0.1:${PORT}`;

/** Browser tests run against the finished build, on a database of their own with the demo's shop in it. */
export default defineConfig({
  testDir: "tests/e2e",
  outputDir: "test-results/e2e",
  // One shop and one database: tests that sell and cut at the same time would see each other's stock.
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [["list"], ["json", { outputFile: "test-results/e2e.json" }]],
  use: {
    baseURL: ADDRESS,
    locale: "en-US",
    timezoneId: "UTC",
    viewport: { width: 1440, height: 900 },
    trace: "retain-on-failure",
    screenshot: "only-on-failure",
    launchOptions: {
      executablePath: process.env.CHROMIUM || "/usr/bin/chromium",
      args: [
        "--no-sandbox",
        "--disable-dev-shm-usage",
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
      ],
    },
  },
  webServer: {
    command: `node --import tsx scripts/e2e-server.ts --port ${PORT}`,
    url: `${ADDRESS}/api/health`,
    reuseExistingServer: false,
    timeout: 240_000,
    stdout: "pipe",
    stderr: "pipe",
    gracefulShutdown: { signal: "SIGTERM", timeout: 15_000 },
  },
});
