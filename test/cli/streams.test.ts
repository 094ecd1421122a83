import { existsSync, mkdirSync } from "node:fs";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { beforeEach, describe, expect, it } from "vitest";
import { claim, cupel, filesIn, MAIN, shell, workshop } from "./cupel.js";

const { path: root, write } = workshop();
let cwd: string;
let count = 0;
beforeEach(() => {
  const folder = `test-${count++}`;
  cwd = join(root, folder);
  mkdirSync(cwd);
  write(`${folder}/quick.yaml`, claim());
  // Minutes of work.
  write(
    `${folder}/slow.yaml`,
    claim({ span: "40000 orbits", solution: "{ method: rk4, steps-per-orbit: 512 }" }),
  );
});

describe("a pipe closed early", () => {
  const TELL = 'echo "left with $PIPESTATUS"';

  it.each([
    ["$CUPEL audit quick.yaml --no-report", 0],
    ["$CUPEL audit quick.yaml --no-report --json -", 0],
    ["$CUPEL audit quick.yaml bad.yaml --no-report", 2],
    ["$CUPEL catalog methods", 0],
    ["$CUPEL schema", 0],
    ["$CUPEL --help", 0],
  ])("'%s | head -1' is no failure", async (line, code) => {
    write(`test-${count - 1}/bad.yaml`, claim({ span: "none" }));
    const { stdout, stderr } = await shell(`${line} | head -1; ${TELL}`, { cwd });
    expect(stdout.split("\n")).toEqual([expect.any(String), `left with ${code}`, ""]);
    expect(stderr.replace(/^bad\.yaml:.*\n/, "")).toBe("");
  });

  it("is no failure where nobody reads at all", async () => {
    const { stdout, stderr } = await shell(`$CUPEL audit quick.yaml --no-report --json - | true; ${TELL}`, {
      cwd,
    });
    expect([stdout, stderr]).toEqual(["left with 0\n", ""]);
  });

  it("on both streams is no failure", async () => {
    const { stdout } = await shell(`$CUPEL audit quick.yaml bad 2>&1 | true; ${TELL}`, {
      cwd,
    });
    expect(stdout).toBe("left with 2\n");
  });
});

describe("a signal in the middle of the work", () => {
  it.each([
    ["SIGINT", 130],
    ["SIGTERM", 143],
    ["SIGHUP", 129],
  ] as const)("%s ends it at once and leaves no file", async (signal, code) => {
    const pages = join(cwd, "pages/deep");
    let sent = 0;
    const ended = await cupel(
      ["audit", "slow.yaml", "quick.yaml", "--out", "pages/deep", "--json", "r.json"],
      {
        cwd,
        meanwhile: async (child) => {
          while (!existsSync(pages)) await pause(20);
          await pause(1500);
          sent = performance.now();
          child.kill(signal);
        },
      },
    );
    expect(ended).toEqual({ code, signal: null, stdout: "", stderr: "cupel: interrupted\n" });
    expect(performance.now() - sent).toBeLessThan(3000);
    expect(filesIn(cwd)).toEqual(["quick.yaml", "slow.yaml"]);
  });
});

describe("a terminal", () => {
  const REDRAW = "\r\u001b[K";
  const BOLD = "\u001b[1m";

  /** Runs a line on a pseudo-terminal of util-linux's script; both streams arrive as one. */
  const onTerminal = (line: string, env: Record<string, string> = {}) =>
    shell(`script -qec '${line}' /dev/null`, { cwd, env: { TERM: "xterm-256color", ...env } });
  const RUN = `${process.execPath} ${MAIN}`;

  it("shows how far the work is, and takes it away at the end", async () => {
    const { stdout } = await onTerminal(`${RUN} audit quick.yaml --no-report`);
    const drawn = stdout.split(REDRAW);
    expect(drawn.length).toBeGreaterThan(2);
    for (const line of drawn.slice(1, -1)) expect(line).toMatch(/^( *\d+ % {2}quick\.yaml)?$/);
    expect(drawn.at(-1)).toMatch(/^RESOLVED/);
  });

  it("is left alone by --quiet", async () => {
    const { stdout } = await onTerminal(`${RUN} audit quick.yaml --no-report --quiet`);
    expect(stdout).toMatch(/^RESOLVED {9}[AB] {2}quick\.yaml\r\n$/);
  });

  it("is coloured unless NO_COLOR or --colour never ask otherwise", async () => {
    const line = `${RUN} audit quick.yaml --no-report`;
    expect((await onTerminal(`env -u NO_COLOR -u CI TERM=xterm-256color ${line}`)).stdout).toContain(BOLD);
    expect((await onTerminal(line)).stdout).not.toContain(BOLD);
    expect(
      (await onTerminal(`env -u NO_COLOR -u CI TERM=xterm-256color ${line} --colour never`)).stdout,
    ).not.toContain(BOLD);
  });

  it("is not needed for colour when asked for", async () => {
    const { stdout } = await cupel(["audit", "quick.yaml", "--no-report", "--colour", "always"], { cwd });
    expect(stdout.startsWith(BOLD)).toBe(true);
  });
});
