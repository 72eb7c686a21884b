const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\'': '&#39;' }
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, letter => entities[letter] ?? letter)

/** Colours and type of the day theme, inline because mail readers know no style sheets. */
export const look = {
  paper: '#faf7f0', ink: '#364054', muted: '#6b6a66', rule: '#d8d2c4', accent: '#a3481f', bad: '#9c2b23',
  text: '\'Atkinson Hyperlegible Next\', Verdana, \'Segoe UI\', sans-serif',
  mono: '\'Atkinson Hyperlegible Mono\', Consolas, Menlo, monospace',
}

const footer = (accountLink?: string, why?: string): string => accountLink
  ? `Which mails you get is chosen on <a href="${escapeHtml(accountLink)}" style="color:${look.muted}">your account page</a>.`
  : escapeHtml(why ?? '')

/** The sheet that every mail of ours is written on. `body` is markup already made safe; `why` stands at the foot of mails that nobody can switch off. */
export const page = ({ title, body, accountLink, why }: { title: string, body: string, accountLink?: string, why?: string }): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escapeHtml(title)}</title></head>
<body style="margin:0;background:${look.paper};color:${look.ink};font-family:${look.text};font-size:16px;line-height:1.5">
<table role="presentation" width="100%" cellpadding="0" cellspacing="0"><tr><td align="center" style="padding:28px 16px">
<table role="presentation" width="560" cellpadding="0" cellspacing="0" style="max-width:560px;width:100%"><tr><td>
<p style="margin:0 0 20px;font-size:14px;letter-spacing:.04em;color:${look.muted};border-bottom:2px solid ${look.ink};padding-bottom:6px">Trotline</p>
${body}
<p style="margin:32px 0 0;border-top:1px solid ${look.rule};padding-top:12px;font-size:13px;color:${look.muted}">${footer(accountLink, why)}</p>
</td></tr></table></td></tr></table></body></html>`

export const paragraph = (text: string, colour = look.ink): string => `<p style="margin:0 0 12px;color:${colour}">${escapeHtml(text)}</p>`

export const list = (items: string[]): string =>
  items.length === 0 ? '' : `<ul style="margin:0 0 12px;padding-left:20px">${items.map(item => `<li>${escapeHtml(item)}</li>`).join('')}</ul>`

export const button = (link: string, words: string): string =>
  `<p style="margin:20px 0"><a href="${escapeHtml(link)}" style="display:inline-block;padding:10px 16px;background:${look.ink};color:${look.paper};text-decoration:none">${escapeHtml(words)}</a></p>`
