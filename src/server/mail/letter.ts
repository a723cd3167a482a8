/** What a message says; both bodies are made of it. */
export interface LetterParts {
  readonly subject: string;
  readonly title: string;
  readonly paragraphs: readonly string[];
  /** The one thing to do. */
  readonly action?: { readonly label: string; readonly href: string };
  /** Said small below: why one got this, and what to do if it was not meant. */
  readonly foot: string;
}

export interface Letter {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

const escaped = (text: string): string => text.replace(/[&<>"']/g, (sign) => ENTITIES[sign] ?? sign);

/** One line: a name with a line break in it starts no header of its own. */
const oneLine = (text: string): string => text.replace(/\s+/g, ' ').trim();

const INK = '#20242c';
const MUTED = '#655f56';
const P = `margin:0 0 14px;font-size:16px;line-height:24px;color:${INK}`;

function actionHtml({ label, href }: NonNullable<LetterParts['action']>): string {
  const button =
    'display:inline-block;padding:11px 20px;background:#266f65;color:#ffffff;border-radius:4px;' +
    'font-size:16px;font-weight:600;text-decoration:none';
  return (
    `<p style="margin:24px 0 10px"><a href="${escaped(href)}" style="${button}">${escaped(label)}</a></p>` +
    `<p style="margin:0 0 24px;font-size:13px;line-height:20px;color:${MUTED};word-break:break-all">` +
    `Or open ${escaped(href)}</p>`
  );
}

function htmlOf({ title, paragraphs, action, foot }: LetterParts): string {
  const font = "font-family:'Work Sans',system-ui,-apple-system,'Segoe UI',sans-serif";
  return [
    '<!doctype html><html lang="en-GB"><head><meta charset="utf-8"><meta name="color-scheme" content="light">',
    `<title>${escaped(title)}</title></head><body style="margin:0;background:#faf7f2;${font}">`,
    '<div style="max-width:560px;margin:0 auto;padding:28px 16px">',
    `<p style="margin:0 0 14px;font-size:15px;font-weight:600;color:${INK}">Steadmain</p>`,
    '<div style="background:#ffffff;border:1px solid #e2dbcf;border-top:3px solid #b3622b;padding:26px 24px 12px">',
    `<h1 style="margin:0 0 16px;font-size:22px;line-height:28px;font-weight:600;color:${INK}">${escaped(title)}</h1>`,
    ...paragraphs.map((paragraph) => `<p style="${P}">${escaped(paragraph)}</p>`),
    action ? actionHtml(action) : '',
    `</div><p style="margin:14px 0 0;font-size:13px;line-height:20px;color:${MUTED}">${escaped(foot)}</p>`,
    '</div></body></html>',
  ].join('\n');
}

/** A message in plain text and in HTML without images or anything fetched. */
export function letter(parts: LetterParts): Letter {
  const { subject, title, paragraphs, action, foot } = parts;
  const lines = [title, ...paragraphs, ...(action ? [`${action.label}:\n${action.href}`] : []), `-- \n${foot}`];
  return { subject: oneLine(subject), text: `${lines.join('\n\n')}\n`, html: htmlOf(parts) };
}
