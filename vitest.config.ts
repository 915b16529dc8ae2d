import { defineConfig } from "vitest/config";

export default defineConfig({
  test: {
    include: ["test/**/*.test.ts"],
    exclude: ["dist/**", "node_modules/**"],
    // Two cores are the common case; processes, because the database driver is a native module.
    pool: "forks",
    maxWorkers: 2,
    testTimeout: 15_000,
  },
});
