// Begins the parser thread. The bundle of the pages holds no TypeScript, and a thread inherits no loader, so it brings its own.
import { register } from "tsx/esm/api";

register();
await import("./parserThread.ts");
