import { existsSync } from "node:fs";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import axe from "axe-core";
import { type Browser, type BrowserContextOptions, chromium, type Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { renderIndex } from "../../src/report/page/index-page.js";
import { renderPage } from "../../src/report/page/page.js";
import type { ClaimResult } from "../../src/result/result.js";
import { auditSamples, bare, unreadableResult } from "./results.js";

/** Where Debian's package puts it. */
const CHROMIUM = process.env.CHROMIUM ?? "/usr/bin/chromium";
const isThere = existsSync(CHROMIUM);
if (!isThere) console.warn(`pages are not opened in a browser: there is no ${CHROMIUM}`);

const WIDTHS = [360, 768, 1280, 1600];
const SCHEMES = ["light", "dark"] as const;
const LOOKS = SCHEMES.flatMap((colorScheme) => [360, 1280].map((width) => ({ colorScheme, width })));
/** A browser on a busy machine takes its time; ms. */
const SLOW = 240_000;
const LONG = "an-unbroken-name-that-goes-on-and-on-".repeat(6);

let browser: Browser;
let folder: string;
const pages = new Map<string, string>();

beforeAll(async () => {
  if (!isThere) return;
  const results = await auditSamples([
    "demo.yaml",
    "mercury-subtracted.yaml",
    "leapfrog-kepler.yaml",
    "text-only.yaml",
  ]);
  const demo = results.get("demo")!;
  const all: [string, ClaimResult][] = [
    ...results,
    ["unreadable", await unreadableResult()],
    ["bare", bare(demo)],
    [
      "long",
      {
        ...demo,
        title: LONG,
        file: LONG,
        reason: LONG,
        claimed: { ...demo.claimed!, text: LONG, unit: LONG },
      },
    ],
    ["planted", { ...demo, title: "<img src=x onerror=alert(1)><script>alert(2)</script>" }],
  ];
  folder = await mkdtemp(join(tmpdir(), "cupel-pages-"));
  const write = async (name: string, html: string): Promise<void> => {
    const path = join(folder, `${name}.html`);
    await writeFile(path, html);
    pages.set(name, pathToFileURL(path).href);
  };
  for (const [name, result] of all) await write(name, await renderPage(result));
  await write("index", await renderIndex(all.map(([name, result]) => ({ result, href: `${name}.html` }))));
  browser = await chromium.launch({ executablePath: CHROMIUM, args: ["--no-sandbox", "--disable-gpu"] });
}, 180_000);

afterAll(async () => {
  await browser?.close();
  if (folder !== undefined) await rm(folder, { recursive: true });
});

/** Opens a page and collects all that it says and asks for. */
async function visit<T>(url: string, options: BrowserContextOptions, look: (page: Page) => Promise<T>) {
  const context = await browser.newContext(options);
  const noise: string[] = [];
  try {
    const page = await context.newPage();
    page.on("console", (message) => noise.push(message.text()));
    page.on("pageerror", (error) => noise.push(String(error)));
    page.on("dialog", (dialog) => noise.push(`dialog: ${dialog.message()}`));
    page.on("request", (request) => {
      if (request.url() !== url) noise.push(`request: ${request.url()}`);
    });
    await page.goto(url);
    return { found: await look(page), noise };
  } finally {
    await context.close();
  }
}

describe.skipIf(!isThere)("in a browser, every page", () => {
  it(
    "is silent and asks for nothing, and nothing sticks out at any width",
    async () => {
      for (const [name, url] of pages) {
        const { noise } = await visit(url, {}, async (page) => {
          for (const width of WIDTHS) {
            await page.setViewportSize({ width, height: 900 });
            for (const colorScheme of SCHEMES) {
              await page.emulateMedia({ colorScheme });
              const sticking = await page.evaluate(STICKING_OUT);
              expect(sticking, `${name} at ${width}`).toEqual([]);
            }
          }
        });
        expect(noise, name).toEqual([]);
      }
    },
    SLOW,
  );

  it(
    "has no violation that axe knows of, in light and dark, narrow and wide",
    async () => {
      // The fullest page in all four ways, and one of each other kind.
      const looks = [
        ...LOOKS.map((look) => ({ name: "demo", ...look })),
        ...["text-only", "unreadable", "long", "index"].map((name, k) => ({ name, ...LOOKS[k]! })),
      ];
      for (const { name, colorScheme, width } of looks) {
        const options = { colorScheme, viewport: { width, height: 900 }, bypassCSP: true };
        const { found } = await visit(pages.get(name)!, options, async (page) => {
          await page.evaluate(axe.source);
          return page.evaluate(AXE);
        });
        expect(found, `${name}, ${colorScheme}, ${width}`).toEqual([]);
      }
    },
    SLOW,
  );

  it("differs between light and dark", async () => {
    const paper = async (colorScheme: "light" | "dark"): Promise<string> => {
      const { found } = await visit(pages.get("demo")!, { colorScheme }, (page) =>
        page.evaluate<string>("getComputedStyle(document.body).backgroundColor"),
      );
      return found;
    };
    expect(await paper("light")).not.toBe(await paper("dark"));
  });

  it(
    "prints whole: no plot across two sheets, no table cut off, no ladder left out",
    async () => {
      for (const [name, url] of pages) {
        const { found: size } = await visit(url, { viewport: A4 }, async (page) => {
          await page.emulateMedia({ media: "print" });
          expect(await page.evaluate(CUT_IN_PRINT), name).toEqual([]);
          return (
            await page.pdf({
              format: "A4",
              margin: { top: "15mm", bottom: "15mm", left: "15mm", right: "15mm" },
            })
          ).length;
        });
        expect(size, name).toBeGreaterThan(5000);
        // Lines drawn far beyond their frame made 4 MB.
        expect(size, name).toBeLessThan(1_500_000);
      }
    },
    SLOW,
  );

  it("can be read by keyboard: the way past comes first, and tables and ladders can be reached", async () => {
    await visit(pages.get("demo")!, {}, async (page) => {
      const reached: string[] = [];
      for (let k = 0; k < 40; k++) {
        await page.keyboard.press("Tab");
        const at = await page.evaluate<string>(FOCUSED);
        reached.push(at);
      }
      expect(reached[0]).toBe("a.skip visible");
      expect(reached.filter((at) => at.startsWith("summary")).length).toBeGreaterThan(3);
      expect(reached.filter((at) => at.startsWith("div.scroll")).length).toBeGreaterThan(3);
      expect(reached.filter((at) => !at.endsWith(" visible") && !at.startsWith("body"))).toEqual([]);
    });
  });
});

/** A4 less margins of 15 mm, in CSS pixels. */
const A4 = { width: 680, height: 1009 };

// Scripts for the browser are text: the compiler here does not know its objects.

const STICKING_OUT = `(() => {
  const width = document.documentElement.clientWidth;
  const held = (element) => element.closest(".scroll") !== null || element.matches(".skip");
  return document.documentElement.scrollWidth <= width ? [] :
    [...document.querySelectorAll("body *")]
      .filter((element) => !held(element) && element.getBoundingClientRect().right > width + 0.5)
      .map((element) => element.outerHTML.slice(0, 120));
})()`;

const AXE = `axe.run().then(({ violations }) =>
  violations.map(({ id, nodes }) => id + ": " + nodes.slice(0, 3).map(({ html }) => html.slice(0, 160)).join(" | ")))`;

const CUT_IN_PRINT = `(() => {
  const cut = [];
  for (const figure of document.querySelectorAll("figure")) {
    const { height } = figure.getBoundingClientRect();
    if (height > ${1009}) cut.push("figure of " + height);
    if (getComputedStyle(figure).breakInside !== "avoid") cut.push("a figure may break");
  }
  for (const svg of document.querySelectorAll("svg.wide, svg.fixed")) {
    const { left, right, height } = svg.getBoundingClientRect();
    if (height < 20 || left < -1 || right > innerWidth + 1) cut.push("svg from " + left + " to " + right);
  }
  for (const table of document.querySelectorAll("table")) {
    const { right, height } = table.getBoundingClientRect();
    if (height < 10) cut.push("a table is not there");
    if (right > innerWidth + 1) cut.push("table to " + right + ": " + table.textContent.slice(0, 60));
  }
  return cut;
})()`;

const FOCUSED = `(() => {
  const element = document.activeElement;
  const { left, top, right, bottom } = element.getBoundingClientRect();
  const isVisible = right > 0 && bottom > 0 && left < innerWidth && top < innerHeight;
  return element.localName + (element.className ? "." + element.className : "") + (isVisible ? " visible" : " hidden");
})()`;
