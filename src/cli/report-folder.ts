import { existsSync, rmdirSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { pageNames } from "../report/write.js";
import type { ClaimResult } from "../result/result.js";
import { makeFolders, tryWriting, writeTo } from "./destination.js";

/** The folder of the pages: a page a claim, and an index of several. */
export class ReportFolder {
  readonly #path: string;
  /** Folders that were not there before, innermost first. */
  readonly #made: readonly string[];
  readonly #pages: { readonly result: ClaimResult; readonly href: string; readonly html: Promise<string> }[] =
    [];
  readonly #names: readonly string[];

  private constructor(path: string, made: readonly string[], files: readonly string[]) {
    this.#path = path;
    this.#made = made;
    this.#names = pageNames(files);
  }

  /**
   * Makes the folder ahead of the work.
   *
   * @throws CallError where pages could not be written
   */
  static async open(path: string, files: readonly string[]): Promise<ReportFolder> {
    const made = missing(path);
    const folder = new ReportFolder(path, made, files);
    try {
      await makeFolders(path, made.toReversed());
      await tryWriting(join(path, "index.html"));
    } catch (error) {
      folder.leave();
      throw error;
    }
    return folder;
  }

  /** Loads what pages are drawn with, which takes as long as drawing. */
  prepare(): void {
    import("../report/page/plots/frame.js").then(({ canvas }) => canvas()).catch(() => {});
  }

  /** Begins the page of the next claim; a defect in it shows when the pages are written. */
  add(result: ClaimResult): void {
    const html = import("../report/page/page.js").then(({ renderPage }) => renderPage(result));
    html.catch(() => {});
    this.#pages.push({ result, href: this.#names[this.#pages.length]!, html });
  }

  /**
   * Writes the pages.
   *
   * @returns the page to open: the only one, or the index
   * @throws CallError
   */
  async write(): Promise<string> {
    for (const { href, html } of this.#pages) await writeTo(join(this.#path, href), await html);
    if (this.#pages.length === 1) return join(this.#path, this.#pages[0]!.href);
    const { renderIndex } = await import("../report/page/index-page.js");
    const index = join(this.#path, "index.html");
    await writeTo(index, await renderIndex(this.#pages));
    return index;
  }

  /** Takes away the folders that were made for pages that never came; also for a signal handler. */
  leave(): void {
    for (const folder of this.#made) {
      try {
        rmdirSync(folder);
      } catch {
        return; // not empty: it is in use
      }
    }
  }
}

function missing(path: string): string[] {
  const folders: string[] = [];
  for (let next = resolve(path); !existsSync(next); next = dirname(next)) folders.push(next);
  return folders;
}
