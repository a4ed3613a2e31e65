import fs from "node:fs";
import path from "node:path";

/** What the stand-in remembers, in memory and in one file, so that a restart loses no session and no event. */
export class Store {
  #file;

  constructor(file) {
    this.#file = file;
    const empty = { sessions: {}, events: {}, refunds: {}, answers: {} };
    Object.assign(this, empty, fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, "utf8")) : {});
  }

  save() {
    fs.mkdirSync(path.dirname(this.#file), { recursive: true });
    fs.writeFileSync(`${this.#file}.new`, JSON.stringify(this), { mode: 0o600 });
    fs.renameSync(`${this.#file}.new`, this.#file);
  }
}
