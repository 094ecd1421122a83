import { chmodSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import fc from "fast-check";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { pageNames, removeUnfinished, WriteError, writeWhole } from "../../src/report/write.js";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "cupel-write-"));
});
afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

/** Most bytes that a name may have on the usual file systems (POSIX NAME_MAX of ext4, APFS, NTFS: 255). */
const NAME_MAX = 255;

describe("writing whole", () => {
  it("puts the text there, over what there was, and leaves nothing else", async () => {
    const path = join(folder, "page.html");
    writeFileSync(path, "what there was before, longer than the new text");
    await writeWhole(path, "new");
    expect(readFileSync(path, "utf8")).toBe("new");
    expect(readdirSync(folder)).toEqual(["page.html"]);
  });

  it("says why it cannot, keeps what there was, and leaves nothing else", async () => {
    writeFileSync(join(folder, "file"), "kept");
    mkdirSync(join(folder, "taken"));
    const cases: [string, RegExp][] = [
      [join(folder, "file", "page.html"), /part of the path is a file/],
      [join(folder, "missing", "page.html"), /the folder does not exist/],
      [join(folder, "taken"), /a folder of that name is in the way/],
      [join(folder, `${"n".repeat(300)}.html`), /the name is too long/],
    ];
    for (const [path, why] of cases) {
      const error = await writeWhole(path, "text").catch((reason: unknown) => reason);
      expect(error, path).toBeInstanceOf(WriteError);
      expect((error as WriteError).message).toMatch(why);
      expect((error as WriteError).message).toContain(`cannot write ${path}: `);
    }
    expect(readdirSync(folder).sort()).toEqual(["file", "taken"]);
    expect(readFileSync(join(folder, "file"), "utf8")).toBe("kept");
  });

  // The superuser may write anywhere.
  it.skipIf(process.getuid?.() === 0)("says that it has no permission", async () => {
    chmodSync(folder, 0o555);
    await expect(writeWhole(join(folder, "page.html"), "text")).rejects.toThrow(/no permission/);
    chmodSync(folder, 0o755);
  });

  it("has a half file removed when it is interrupted", async () => {
    const path = join(folder, "page.html");
    const halves = (): string[] => readdirSync(folder).filter((name) => name !== "page.html");
    const writing = writeWhole(path, "x".repeat(100_000_000)).catch((reason: unknown) => reason);
    while (halves().length === 0) await new Promise(setImmediate);
    removeUnfinished();
    expect(halves()).toEqual([]);
    // Nothing is left to be given its name.
    expect(await writing).toBeInstanceOf(WriteError);
    expect(readdirSync(folder)).toEqual([]);
  });
});

describe("the names of pages", () => {
  it("are the claims' own, told apart", () => {
    expect(
      pageNames(["a/orbit.yaml", "b/orbit.yml", "c/Orbit.json", "index.yaml", "two words.yaml"]),
    ).toEqual(["orbit.html", "orbit-2.html", "Orbit-3.html", "index-2.html", "two-words.html"]);
    // One letter, composed and in two.
    expect(pageNames(["caf\u00e9.yaml", "cafe\u0301.yaml"])).toEqual(["caf\u00e9.html", "caf\u00e9-2.html"]);
    expect(pageNames(["..", "../../.yaml", "", "<script>.yaml"])).toEqual([
      "claim.html",
      "claim-2.html",
      "claim-3.html",
      "script-.html",
    ]);
  });

  it("can be written whatever the claims are called: no folder in them, never too long, never two the same", () => {
    const name = fc.oneof(
      fc.string({ unit: "binary", maxLength: 300 }),
      fc.constantFrom("軌".repeat(100), "🪐".repeat(100), "n".repeat(250), "../".repeat(50), "a", "A", "a-2"),
    );
    fc.assert(
      fc.property(fc.array(name, { maxLength: 12 }), (files) => {
        const pages = pageNames(files);
        expect(new Set(pages.map((page) => page.normalize("NFKC").toLowerCase())).size).toBe(files.length);
        for (const page of pages) {
          expect(page).toMatch(/^[^./\\\0][^/\\\0]*\.html$/u);
          // As a temporary file it has a dot, a process id and an ending more.
          expect(Buffer.byteLength(`.${page}.${"9".repeat(10)}.part`)).toBeLessThanOrEqual(NAME_MAX);
        }
      }),
    );
  });
});
