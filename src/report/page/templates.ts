import { readFile } from "node:fs/promises";
import Handlebars from "handlebars";

type Template = (context: object) => string;

const folder = new URL("../../../templates/", import.meta.url);
const compiled = new Map<string, Promise<Template>>();
const handlebars = Handlebars.create();

const PARTIALS = ["style", "plot", "quote", "notice"];
let partials: Promise<void> | undefined;

/** A page's template, compiled once. Everything in it is escaped but SVG of our own. */
export function template(name: string): Promise<Template> {
  let ready = compiled.get(name);
  if (ready === undefined) {
    ready = compile(name);
    compiled.set(name, ready);
  }
  return ready;
}

async function compile(name: string): Promise<Template> {
  partials ??= (async () => {
    for (const partial of PARTIALS) handlebars.registerPartial(partial, await read(partial));
  })();
  await partials;
  return handlebars.compile(await read(name), { strict: true });
}

const read = (name: string): Promise<string> => readFile(new URL(`${name}.hbs`, folder), "utf8");
