import { defineConfig } from "vitest/config";

export default defineConfig({
  test: {
    include: ["test/**/*.test.ts"],
    testTimeout: 60_000,
    hookTimeout: 60_000,
    // One a core: the calibration and the browser take a minute each, side by side.
    maxWorkers: "100%",
  },
});
