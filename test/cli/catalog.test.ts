import { readFileSync } from "node:fs";
import { Ajv2020 } from "ajv/dist/2020.js";
import { describe, expect, it } from "vitest";
import { parse } from "yaml";
import { unitsCatalog } from "../../src/claim/units.js";
import { catalogText } from "../../src/cli/catalog-text.js";
import { equationsCatalog } from "../../src/equations/catalog/index.js";
import { methodsCatalog } from "../../src/methods/catalog/index.js";
import { CLAIMS, cupel } from "./cupel.js";

/** Words of a text, however its lines are broken. */
const flat = (text: string): string => text.replaceAll(/\s+/g, " ");

describe("catalog", () => {
  it("lists every entry of every section", () => {
    const list = catalogText(undefined);
    for (const { name } of [...equationsCatalog, ...methodsCatalog, ...unitsCatalog]) {
      expect(list).toMatch(new RegExp(`^ {2}${name} `, "m"));
    }
  });

  it.each(equationsCatalog.map((equations) => [equations.name, equations] as const))(
    "shows %s",
    (name, it) => {
      const text = flat(catalogText(name));
      for (const part of [it.title, it.display, it.source, ...Object.keys(it.parameters)]) {
        expect(text).toContain(flat(part));
      }
      for (const conserved of Object.keys(it.conserved)) expect(text).toContain(conserved);
      for (const { unit, meaning } of Object.values(it.parameters)) {
        expect(text).toContain(`${unit === "1" ? "a pure number" : unit}: ${meaning}`);
      }
    },
  );

  it.each(methodsCatalog.map((method) => [method.name, method] as const))(
    "shows %s",
    (name, { order, source }) => {
      const text = flat(catalogText(name));
      expect(text).toContain(` order ${order} family `);
      expect(text).toContain(flat(source));
    },
  );

  // What the null run of each leaves out, by design: the light speed or the zonal harmonics.
  it.each([
    ["post-newtonian-1", "c without limit"],
    ["schwarzschild-angle", "c without limit"],
    ["oblate", "J2 = 0, J3 = 0, J4 = 0"],
    ["newtonian", "nothing to switch off"],
  ])("says what the null run of %s switches off", (name, says) => {
    expect(flat(catalogText(name))).toContain(`null run ${says}`);
  });

  it("shows a whole section as its entries, 80 columns wide", () => {
    for (const section of ["equations", "methods", "quantities", "units"]) {
      const text = catalogText(section);
      for (const line of text.split("\n")) expect([...line].length).toBeLessThanOrEqual(80);
    }
    expect(catalogText("methods").split("\n\n")).toHaveLength(methodsCatalog.length);
  });

  it("prints it from the shell", async () => {
    const { code, stdout } = await cupel(["catalog", "rk4"]);
    expect([code, stdout]).toEqual([0, catalogText("rk4")]);
  });
});

describe("schema", () => {
  it("prints a JSON Schema that takes the demo claim and refuses a mistyped key", async () => {
    const { code, stdout } = await cupel(["schema"]);
    expect(code).toBe(0);
    const validate = new Ajv2020({ allowUnionTypes: true }).compile(JSON.parse(stdout));
    const demo = parse(readFileSync(`${CLAIMS}/demo.yaml`, "utf8")) as object;
    expect(validate(demo)).toBe(true);
    expect(validate({ ...demo, remark: "none" })).toBe(false);
  });
});
