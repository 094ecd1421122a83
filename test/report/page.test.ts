import { HtmlValidate } from "html-validate";
import { parseHTML } from "linkedom";
import { beforeAll, describe, expect, it } from "vitest";
import { renderIndex } from "../../src/report/page/index-page.js";
import { renderPage } from "../../src/report/page/page.js";
import { canvas } from "../../src/report/page/plots/frame.js";
import type { ClaimResult } from "../../src/result/result.js";
import { auditSamples, bare, unreadableResult } from "./results.js";

const SAMPLES = ["demo.yaml", "mercury-subtracted.yaml", "leapfrog-kepler.yaml", "text-only.yaml"];
let results: ReadonlyMap<string, ClaimResult>;
let unread: ClaimResult;

beforeAll(async () => {
  results = await auditSamples(SAMPLES);
  unread = await unreadableResult();
}, 120_000);

const sample = (name: string): ClaimResult => results.get(name)!;
const open = (html: string) => parseHTML(html).document;

/** Every result that the tests have, the poorest with them. */
function all(): [string, ClaimResult][] {
  const demo = sample("demo");
  return [
    ...results,
    ["unreadable", unread],
    ["bare", bare(demo)],
    ["without a best value", { ...demo, best: bare(demo).best }],
    ["without a window", { ...demo, ladders: demo.ladders.map(withoutLaw) }],
    ["without rungs that went well", { ...demo, ladders: demo.ladders.map(escaped), passages: null }],
  ];
}

const withoutLaw = (ladder: ClaimResult["ladders"][number]) => ({
  ...ladder,
  window: null,
  figureOrder: null,
  figureOrderInterval: null,
  coefficient: null,
  extrapolated: null,
  floor: null,
});

const escaped = (ladder: ClaimResult["ladders"][number]) => ({
  ...withoutLaw(ladder),
  rungs: ladder.rungs.map((rung) => ({
    ...rung,
    status: "escaped" as const,
    value: null,
    null: null,
    figure: null,
    standardError: null,
    stateDifference: null,
  })),
});

describe("the page", () => {
  it("is valid HTML for every kind of result", async () => {
    const validator = new HtmlValidate({
      extends: ["html-validate:recommended"],
      rules: { "long-title": "off" },
    });
    for (const [name, result] of all()) {
      const report = await validator.validateString(await renderPage(result));
      expect(
        report.results.flatMap(({ messages }) => messages),
        name,
      ).toEqual([]);
    }
    const index = await validator.validateString(
      await renderIndex(all().map(([name, result]) => ({ result, href: `${name}.html` }))),
    );
    expect(index.results.flatMap(({ messages }) => messages)).toEqual([]);
  });

  it("prints no figure that is not there", async () => {
    for (const [name, result] of all()) {
      const document = open(await renderPage(result));
      expect(document.querySelector("body")!.textContent, name).not.toMatch(
        /NaN|Infinity|undefined|\[object/,
      );
      for (const place of document.querySelectorAll("td, dd, figcaption, text, desc")) {
        expect(place.textContent, name).not.toMatch(/\bnull\b(?! run)/);
      }
    }
  });

  it("says the verdict, the reason, the digits and the grade before everything else", async () => {
    const result = sample("demo");
    const text = open(await renderPage(result)).querySelector("main")!.textContent;
    const places = ["Partly resolved", result.reason, "78.62", "1 of 4 quoted digits stands", "Grade C"].map(
      (part) => text.indexOf(part),
    );
    expect(places.every((place) => place >= 0)).toBe(true);
    expect(places.slice(0, 3)).toEqual(places.slice(0, 3).toSorted((a, b) => a - b));
    expect(Math.max(...places)).toBeLessThan(text.indexOf("Claimed and recomputed"));
  });

  it("sets the standing digits apart from the others", async () => {
    const quote = open(await renderPage(sample("demo"))).querySelector(".quote")!;
    expect(quote.querySelector("b")!.textContent).toBe("7");
    expect(quote.querySelector("i")!.textContent).toBe("8.62");
    expect(quote.textContent.trim()).toBe("78.62(2) arcsec/century");
  });

  it("asks the browser for nothing: no script, no address, a policy that forbids both", async () => {
    for (const [name, result] of all()) {
      const html = await renderPage(result);
      const document = open(html);
      expect(document.querySelectorAll("script, link, img, iframe, object, embed").length, name).toBe(0);
      expect(html, name).not.toMatch(/\b(src|href|xlink:href)="(?!#)/);
      expect(html, name).not.toMatch(/url\((?!#)|@import/);
      const policy = document.querySelector("meta[http-equiv]")!.getAttribute("content")!;
      expect(policy).toMatch(
        /^default-src 'none'; style-src 'unsafe-inline'; base-uri 'none'; form-action 'none'$/,
      );
    }
  });

  it("names its limits on every page", async () => {
    for (const [name, result] of all()) {
      const html = await renderPage(result);
      expect(html, name).toContain("judges numerics only");
      expect(html, name).toContain("no clearance for flight, navigation or conjunction work");
      expect(html, name).toContain("licensed practice");
    }
  });

  it("writes no limit as nought that is not", async () => {
    const result = sample("mercury-subtracted");
    const [own, ...others] = result.ladders;
    const loose = { ...own!, extrapolated: { value: 57.92365, halfWidth: 411.4 } };
    const html = await renderPage({ ...result, ladders: [loose, ...others] });
    expect(open(html).querySelector("summary small")!.textContent).toContain("limit 57.9 ±\u00a0411");
  });

  it("promises no null run where nothing can be switched off", async () => {
    const heading = async (name: string) =>
      open(await renderPage(sample(name))).querySelector("#effect")!.textContent;
    expect(await heading("demo")).toBe("With the effect switched off");
    expect(await heading("leapfrog-kepler")).toBe("The figure against the step");
  });

  it("is the same for the same result, whatever was drawn before", async () => {
    const first = await renderPage(sample("demo"));
    await renderPage(sample("leapfrog-kepler"));
    expect(await renderPage(sample("demo"))).toBe(first);
  });

  it("lists every rung of every ladder, every check and every remedy", async () => {
    const result = sample("demo");
    const document = open(await renderPage(result));
    const rungs = result.ladders.flatMap((ladder) => ladder.rungs);
    expect(document.querySelectorAll("table.rungs tbody tr").length).toBe(rungs.length);
    expect(document.querySelectorAll("#checks ~ .body tbody tr").length).toBe(result.checks.length);
    expect(document.querySelectorAll("#remedy ~ .body tbody tr").length).toBe(result.remedy!.options.length);
  });

  it("keeps what is in a claim as text", async () => {
    const evil = `"><script>alert(1)</script><img src=x onerror=alert(2)> {{reason}} {{{svg}}} ' \` </style></svg>`;
    const result = sample("demo");
    const planted: ClaimResult = {
      ...result,
      title: evil,
      file: evil,
      reason: evil,
      claimed: { ...result.claimed!, unit: evil, text: `78.62(2) ${evil}` },
      checks: result.checks.map((check) => ({ ...check, says: evil, unit: evil })),
      ladders: result.ladders.map((ladder) => ({ ...ladder, method: evil, says: evil })),
      ledger: result.ledger.map((entry) => ({ ...entry, quantity: evil, says: evil })),
      setup: {
        ...result.setup!,
        span: evil,
        step: evil,
        equations: { ...result.setup!.equations, display: evil, title: evil, source: evil },
      },
      provenance: { ...result.provenance, command: evil },
    };
    const page = open(await renderPage(planted));
    const index = open(await renderIndex([{ result: planted, href: `${evil}.html` }]));
    for (const document of [page, index]) {
      expect(document.querySelectorAll("script, img").length).toBe(0);
      expect(document.querySelectorAll("style").length).toBe(1);
      for (const element of document.querySelectorAll("*")) {
        for (const { name } of element.attributes) expect(name).not.toMatch(/^on/);
      }
      expect(document.querySelector("body")!.textContent).toContain(evil);
    }
    expect(page.querySelector("title")!.textContent).toContain(evil);
    expect(page.querySelectorAll("svg").length).toBe(
      open(await renderPage(result)).querySelectorAll("svg").length,
    );
  });

  it("drops what would steer a terminal or hide text", async () => {
    const html = await renderPage({ ...sample("demo"), title: "a\u0000b\u001b[31mc\u202ed" });
    for (const hidden of ["\u0000", "\u001b", "\u202e"]) expect(html).not.toContain(hidden);
  });

  it("takes well under 0.4 s once the libraries are loaded", async () => {
    await canvas();
    await renderPage(sample("text-only"));
    const times: number[] = [];
    for (let k = 0; k < 5; k++) {
      const began = performance.now();
      await renderPage(sample("leapfrog-kepler"));
      times.push(performance.now() - began);
    }
    // The least of five: what else the machine does is not the page's doing.
    expect(Math.min(...times)).toBeLessThan(400);
  });
});

describe("the plots", () => {
  it("have a name, a text and a caption each", async () => {
    for (const [name, result] of all()) {
      const document = open(await renderPage(result));
      for (const svg of document.querySelectorAll("svg")) {
        expect(svg.getAttribute("role"), name).toBe("img");
        const [title, says] = svg.getAttribute("aria-labelledby")!.split(" ");
        expect(document.getElementById(title!)!.localName).toBe("title");
        expect(document.getElementById(says!)!.textContent.length, name).toBeGreaterThan(10);
      }
      for (const figure of document.querySelectorAll("figure")) {
        expect(figure.querySelector("figcaption")!.textContent.length, name).toBeGreaterThan(10);
      }
    }
  });

  it("draw a mark for every figure: none is dropped for a value out of a scale", async () => {
    const result = sample("demo");
    const document = open(await renderPage(result));
    const ladder = document.querySelector("svg[aria-labelledby^=ladder-wide]")!;
    const figures = result.ladders.flatMap(({ rungs }) => rungs.filter(({ figure }) => figure !== null));
    // One dot a figure, and the ring about the author's.
    expect(ladder.querySelectorAll("circle").length).toBe(figures.length + 1);
    const names = [...ladder.querySelectorAll("text")].map((text) => text.textContent);
    for (const { method } of result.ladders) expect(names).toContain(method);
    expect(document.querySelectorAll("svg[aria-labelledby^=ledger]").length).toBe(result.ledger.length);
    for (const rows of document.querySelectorAll("svg[aria-labelledby^=intervals-all]")) {
      expect(rows.querySelectorAll("g[fill] > path, circle").length).toBeGreaterThanOrEqual(4);
    }
  });

  it("show the difference where the claim takes its null run off", async () => {
    const steps = async (name: string): Promise<string[]> =>
      [
        ...open(await renderPage(sample(name)))
          .querySelector("svg[aria-labelledby^=steps-wide]")!
          .querySelectorAll("text"),
      ].map((text) => text.textContent);
    expect(await steps("mercury-subtracted")).toEqual(
      expect.arrayContaining(["raw", "null run", "difference"]),
    );
    expect(await steps("demo")).not.toContain("difference");
    // Nothing can be switched off on a Kepler orbit: one curve.
    expect(await steps("leapfrog-kepler")).not.toContain("null run");
  });

  it("tick the finest rung where there are only witnesses", async () => {
    const result = sample("text-only");
    const finest = Math.max(
      ...result.ladders.flatMap(({ rungs }) => rungs.map((rung) => rung.stepsPerOrbit)),
    );
    const document = open(await renderPage(result));
    const ladder = document.querySelector("svg[aria-labelledby^=ladder-wide]")!;
    expect([...ladder.querySelectorAll("text")].map((text) => text.textContent)).toContain(String(finest));
  });

  it("zoom in where the whole would hide the margin", async () => {
    const count = async (result: ClaimResult): Promise<number> =>
      open(await renderPage(result)).querySelectorAll("svg[aria-labelledby^=intervals-near]").length;
    expect(await count(sample("demo"))).toBe(2);
    expect(await count(sample("text-only"))).toBe(0);
  });
});
