/** A letter before it is addressed. Plain text first; the HTML says the same and nothing more. */
export interface Letter {
  subject: string;
  text: string;
  html: string;
}

interface LetterParts {
  subject: string;
  /** In order; shown above the link. */
  before: string[];
  /** The one thing to do, if there is one. */
  link?: { label: string; url: string };
  after?: string[];
}

/** Sets the parts of a letter as text and as HTML, everything escaped. */
export function writeLetter({ subject, before, link, after = [] }: LetterParts): Letter {
  const greeting = 'Hello,';
  const closing = 'Holdfast';
  const lines = [greeting, ...before, ...(link ? [`${link.label}:\n${link.url}`] : []), ...after, closing];
  const blocks = [
    paragraph(greeting),
    ...before.map(paragraph),
    ...(link ? [linkBlock(link)] : []),
    ...after.map(paragraph),
    paragraph(closing),
  ];
  const html = `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><title>${escape(subject)}</title></head>
<body style="margin:0;padding:24px;background:#f7f4ec;color:#191c1e;font:18px/1.5 Verdana,sans-serif">
<div style="max-width:34em">
${blocks.join('\n')}
</div>
</body>
</html>
`;
  return { subject, text: `${lines.join('\n\n')}\n`, html };
}

function paragraph(text: string): string {
  return `<p style="margin:0 0 16px">${escape(text)}</p>`;
}

function linkBlock({ label, url }: { label: string; url: string }): string {
  const look =
    'display:inline-block;padding:14px 22px;border-radius:6px;background:#1a4b9c;color:#fffdf7;font-weight:bold';
  return `<p style="margin:0 0 16px"><a href="${escape(url)}" style="${look}">${escape(label)}</a></p>
<p style="margin:0 0 16px;font-size:15px;color:#4d5357">If the button does nothing, copy this into your browser:<br>${escape(url)}</p>`;
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}
