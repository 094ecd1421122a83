import { existsSync, readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";

const page = readFileSync("DEVELOPERS.md", "utf8");

/** Folders of `src` and what each may import from, as the contributors' page has it. */
const allowed = new Map(
  [...page.matchAll(/^\| `src\/(\w+)` \| .+ \| (.+) \|$/gm)].map(([, folder, from]) => [
    folder!,
    from === "nothing" ? [] : from!.split(", "),
  ]),
);

/** Other folders of `src` that the files of one import from. */
function imported(folder: string): string[] {
  const files = (readdirSync(join("src", folder), { recursive: true }) as string[]).filter((name) =>
    name.endsWith(".ts"),
  );
  const names = files.flatMap((name) => {
    const text = readFileSync(join("src", folder, name), "utf8");
    return [...text.matchAll(/(?:\bfrom |\bimport\()"(?:\.\.\/)+(\w+)\//g)].map(([, from]) => from!);
  });
  return [...new Set(names)].filter((name) => name !== folder && existsSync(join("src", name)));
}

describe("the contributors' page", () => {
  it("lists the folders of src, all of them", () => {
    expect([...allowed.keys()].sort()).toEqual(readdirSync("src").sort());
  });

  it.each([...allowed])("says what src/%s imports from", (folder, from) => {
    for (const name of imported(folder)) expect(from).toContain(name);
  });

  it("names files and folders that there are", () => {
    const paths = [...page.matchAll(/`((?:src|test|templates|fixtures)(?:\/[\w.-]+)*)`/g)].map(
      ([, path]) => path!,
    );
    expect(paths.length).toBeGreaterThan(10);
    for (const path of paths) expect(existsSync(path), path).toBe(true);
  });

  it("names npm scripts that there are", () => {
    const { scripts } = JSON.parse(readFileSync("package.json", "utf8")) as { scripts: object };
    for (const [, name] of page.matchAll(/npm run (\w+)/g)) expect(scripts).toHaveProperty(name!);
  });
});
