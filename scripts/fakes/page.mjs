const STYLE = `
  :root { color-scheme: light dark; }
  body { max-width: 44rem; margin: 0 auto; padding: 1.5rem 1rem 4rem; font: 1rem/1.5 system-ui, sans-serif; }
  header { border-bottom: 2px solid; margin-bottom: 1.5rem; }
  h1 { font-size: 1.25rem; margin: 0 0 .5rem; }
  table { width: 100%; border-collapse: collapse; }
  th, td { text-align: left; vertical-align: top; padding: .4rem .75rem .4rem 0; border-bottom: 1px solid GrayText; }
  td:last-child, th:last-child { padding-right: 0; }
  .amount { text-align: right; white-space: nowrap; }
  form { display: grid; gap: .75rem; margin-top: 1.5rem; }
  button { font: inherit; padding: .7rem 1rem; text-align: left; cursor: pointer; }
  pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; }
  iframe { width: 100%; height: 32rem; border: 1px solid GrayText; background: white; }
  td, dd { overflow-wrap: anywhere; }
  [role=status] { border: 2px solid; padding: .6rem 1rem; }
`;

/** A page of a local stand-in: plain, and told apart from the product at a glance. @param body markup, already escaped */
export const page = (title, body) =>
  `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">` +
  `<title>${escape(title)}</title><style>${STYLE}</style></head><body><header><h1>${escape(title)}</h1></header>` +
  `<main>${body}</main></body></html>`;

export const escape = (text) => String(text).replace(/[&<>"']/g, (character) => `&#${character.codePointAt(0)};`);

export const sendPage = (response, status, html) =>
  response.writeHead(status, { "content-type": "text/html; charset=utf-8", "cache-control": "no-store" }).end(html);

export const sendJson = (response, status, value, headers = {}) =>
  response.writeHead(status, { "content-type": "application/json", ...headers }).end(JSON.stringify(value));

export async function bodyOf(request) {
  const chunks = [];
  for await (const chunk of request) chunks.push(chunk);
  return Buffer.concat(chunks).toString("utf8");
}
