import { readdirSync, readFileSync } from "node:fs";
import Handlebars from "handlebars";

/** The package's templates lie three folders up, whether this runs from src or from dist. */
const FOLDER = new URL("../../../templates/", import.meta.url);

type Template = (model: object) => string;

let compiled: ReadonlyMap<string, Template> | null = null;

/**
 * Fills a template of the package. Every value is escaped; a value that the template asks for and the model
 * does not have is a defect, not an empty place.
 *
 * @param name without `.hbs`
 */
export function fill(name: string, model: object): string {
  compiled ??= compileAll();
  const template = compiled.get(name);
  if (template === undefined) throw new Error(`there is no template '${name}'`);
  return template(model);
}

/** Every template is a partial of every other. */
function compileAll(): ReadonlyMap<string, Template> {
  const handlebars = Handlebars.create();
  const names = readdirSync(FOLDER)
    .filter((file) => file.endsWith(".hbs"))
    .map((file) => file.slice(0, -4));
  return new Map(
    names.map((name) => {
      const source = readFileSync(new URL(`${name}.hbs`, FOLDER), "utf8");
      const template = handlebars.compile(source, { strict: true });
      handlebars.registerPartial(name, template);
      return [name, template];
    }),
  );
}
