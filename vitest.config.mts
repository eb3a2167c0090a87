import path from "node:path";
import { defineConfig } from "vitest/config";

const alias = { "@": path.resolve(import.meta.dirname) };

export default defineConfig({
  resolve: { alias },
  test: {
    projects: [
      { resolve: { alias }, test: { name: "unit", sequence: { groupOrder: 0 }, include: ["tests/unit/**/*.test.ts", "tests/unit/**/*.test.tsx"], testTimeout: 30_000 } },
      { resolve: { alias }, test: { name: "reference", sequence: { groupOrder: 0 }, include: ["tests/reference/**/*.test.ts"], testTimeout: 60_000 } },
      {
        resolve: { alias },
        test: {
          name: "db",
          sequence: { groupOrder: 1 },
          include: ["tests/db/**/*.test.ts"],
          globalSetup: ["tests/db/global-setup.ts"],
          testTimeout: 60_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
    ],
  },
});
