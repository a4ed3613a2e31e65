/** Name of a worker that is started only to tell which files it is made of. */
export const TELLS_FILES = "files";
