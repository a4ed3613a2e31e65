import { TELLS_FILES } from "./filesName";

/** In a worker that was started to tell its files: sends the paths of the scripts it was made of. */
if (self.name === TELLS_FILES)
  setTimeout(() => {
    const parts = performance.getEntriesByType("resource").map(({ name }) => new URL(name).pathname);
    postMessage([location.pathname, ...parts]);
  });
