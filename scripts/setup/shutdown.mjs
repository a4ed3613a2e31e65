import { say } from "./say.mjs";

/** @type {Set<() => unknown>} what has to be undone, in the order it was done */
const tasks = new Set();
let stopping = null;

/** Registers something to undo when the command ends. @returns a function that takes it back */
export function onStop(task) {
  tasks.add(task);
  return () => tasks.delete(task);
}

export const isStopping = () => stopping !== null;

/** Undoes everything, latest first, says the last words and ends the process. Repeated calls wait for the first. */
export function stop(code, lastWords) {
  stopping ??= undoAll().then(() => {
    if (lastWords) say(lastWords);
    process.exit(code);
  });
  return stopping;
}

/** Ctrl-C, a service manager's stop, a closed terminal, and a killed npm all mean the same. */
export function stopOnSignals() {
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) {
    process.on(signal, () => {
      if (!stopping) say("Stopping ...");
      void stop(signal === "SIGINT" ? 0 : 143);
    });
  }
  // npm does not always hand a signal on; without it this process would live on unseen.
  if (process.env.npm_lifecycle_event) {
    const parent = process.ppid;
    setInterval(() => process.ppid !== parent && stop(143), 1000).unref();
  }
}

async function undoAll() {
  for (const task of [...tasks].reverse()) {
    try {
      await task();
    } catch (error) {
      say(`While stopping: ${error.message}`);
    }
  }
}
