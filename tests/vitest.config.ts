import { defineConfig } from "vitest/config";
import react from "@vitejs/plugin-react";
import path from "node:path";

const root = path.resolve(import.meta.dirname, "..");
const alias = { "server-only": path.join(root, "tests/support/server-only.ts") };

/** A busy machine is slow; a test that says how fast something must be measures it itself. */
const patience = { testTimeout: 60_000, hookTimeout: 60_000 };

export default defineConfig({
  root,
  resolve: { tsconfigPaths: true },
  test: {
    projects: [
      {
        root,
        resolve: { tsconfigPaths: true, alias },
        test: {
          name: "node",
          environment: "node",
          include: ["tests/**/*.test.ts"],
          exclude: ["tests/browser/**"],
          setupFiles: ["tests/setup.ts"],
          ...patience,
          execArgv: ["--import", path.join(root, "tests/support/threads.mjs")],
        },
      },
      {
        root,
        plugins: [react()],
        resolve: { tsconfigPaths: true, alias },
        test: {
          name: "dom",
          environment: "jsdom",
          include: ["tests/**/*.test.tsx"],
          setupFiles: ["tests/setup.ts"],
          ...patience,
        },
      },
    ],
  },
});
