import { escape, page, sendJson, sendPage } from "../page.mjs";

const TITLE = "Mails of the demonstration";

/** Shows what was mailed, as pages for people and as JSON for tests. */
export function answerMailPages(request, response, mailbox) {
  const { pathname, searchParams } = new URL(request.url, "http://127.0.0.1");
  const to = searchParams.get("to") || undefined;
  const [, id, attachment] = pathname.match(/^\/mails\/([\w-]+)(?:\/(\d+))?$/) ?? [];
  const mail = id && mailbox.find(id);
  if (pathname === "/mails.json") return sendJson(response, 200, mailbox.list(to).map(described));
  if (pathname === "/") return sendPage(response, 200, page(TITLE, listOf(mailbox.list(to))));
  if (mail && attachment === undefined) return sendPage(response, 200, page(mail.subject || TITLE, contentOf(mail)));
  const file = mail?.attachments[Number(attachment)];
  if (!file) return sendPage(response, 404, page(TITLE, "<p>There is no such mail.</p>"));
  response.writeHead(200, {
    "content-type": file.contentType,
    "content-disposition": `attachment; filename*=UTF-8''${encodeURIComponent(file.filename)}`,
  });
  response.end(Buffer.from(file.base64, "base64"));
}

const attachmentPath = (mail, index) => `/mails/${mail.id}/${index}`;

const described = (mail) => ({
  ...mail,
  attachments: mail.attachments.map(({ filename, contentType, size }, index) => ({
    filename,
    contentType,
    size,
    url: attachmentPath(mail, index),
  })),
});

function listOf(mails) {
  if (mails.length === 0) return "<p>No mail has come yet. Load the page again after the next act.</p>";
  const rows = mails.map(
    (mail) =>
      `<tr><td><a href="/mails/${mail.id}">${escape(mail.subject || "(no subject)")}</a></td>` +
      `<td>${escape(mail.to.join(", "))}</td><td>${time(mail)}</td></tr>`,
  );
  return `<table><thead><tr><th>Subject</th><th>To</th><th>Came</th></tr></thead><tbody>${rows.join("")}</tbody></table>`;
}

function contentOf(mail) {
  const files = mail.attachments.map(
    ({ filename, size }, index) =>
      `<li><a href="${attachmentPath(mail, index)}">${escape(filename)}</a> (${Math.ceil(size / 1024)} kB)</li>`,
  );
  return [
    `<p>From ${escape(mail.from)}<br>To ${escape(mail.to.join(", "))}<br>Came ${time(mail)}</p>`,
    `<pre>${linked(mail.text)}</pre>`,
    files.length > 0 ? `<h2>Attached</h2><ul>${files.join("")}</ul>` : "",
    mail.html ? `<h2>As sent</h2>${framed(mail.html)}` : "",
    '<p><a href="/">All mails</a></p>',
  ].join("");
}

/** A mail's own markup runs nothing here; its links open outside the frame. */
const framed = (html) =>
  `<iframe title="The mail as sent" sandbox="allow-popups allow-popups-to-escape-sandbox" ` +
  `srcdoc="${escape(`<base target="_blank">${html}`)}"></iframe>`;

const linked = (text) =>
  text
    .split(/(https?:\/\/[^\s<>"]+[^\s<>".,;:!?)])/)
    .map((part, index) => (index % 2 === 1 ? `<a href="${escape(part)}">${escape(part)}</a>` : escape(part)))
    .join("");

const time = (mail) => `<time datetime="${mail.received}">${mail.received.slice(0, 19).replace("T", " ")} UTC</time>`;
