// `node --import ./scripts/register.mjs file.ts`: TypeScript and the `@/` paths of tsconfig.json, in one process.
import { register } from "node:module";
import { register as registerTypeScript } from "tsx/esm/api";

registerTypeScript();
// "server-only" throws outside Next's server bundle. The react-server condition would cure that and break the PDF library.
const hook = `export const resolve = (specifier, context, next) =>
  specifier === "server-only" ? { url: "data:text/javascript,", format: "module", shortCircuit: true } : next(specifier, context);`;
register(`data:text/javascript,${encodeURIComponent(hook)}`);
