import type { MailContent, MailMark } from './layout';

/** The light set of the look, as literals: mail programs know no variables, and many no style sheets. */
const paper = '#f5f2ea';
const ink = '#17212b';
const ink2 = '#55606a';
const rule = '#d9d3c5';
const buoy = '#cf4315';
const sans = "font-family:'Helvetica Neue',Helvetica,Arial,sans-serif";
const mono = "font-family:Menlo,Consolas,'Liberation Mono',monospace";

const marks: Record<MailMark, { sign: string; colour: string }> = {
	accept: { sign: '✓', colour: '#2b6a4d' },
	conditions: { sign: '✓', colour: '#2b6a4d' },
	hold: { sign: '‖', colour: '#8f5c0a' },
	reject: { sign: '✕', colour: '#9e1f33' }
};

/** Text of people and firms, made harmless in HTML and in an attribute. */
export function escapeHtml(text: string): string {
	return text.replace(
		/[&<>"']/g,
		(sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' })[sign] ?? sign
	);
}

function paragraph(text: string, style = ''): string {
	return `<p style="margin:0 0 14px;${style}">${escapeHtml(text)}</p>`;
}

function factRow({ label, value, isFigure }: MailContent['facts'][number]): string {
	const cell = `padding:11px 0;border-top:1px solid ${rule};vertical-align:top`;
	return (
		`<tr><td width="190" style="${cell};padding-right:16px;color:${ink2};font-size:15px">${escapeHtml(label)}</td>` +
		`<td style="${cell};font-size:15px;${isFigure ? mono : ''}">${escapeHtml(value)}</td></tr>`
	);
}

function facts(rows: MailContent['facts']): string {
	if (rows.length === 0) return '';
	return (
		`<table role="presentation" width="100%" cellpadding="0" cellspacing="0" ` +
		`style="margin:22px 0;border-top:2px solid ${ink};border-bottom:2px solid ${ink}">${rows.map(factRow).join('')}</table>`
	);
}

function outcomes(rows: MailContent['outcomes'] = []): string {
	if (rows.length === 0) return '';
	const row = ({ mark, name, words }: NonNullable<MailContent['outcomes']>[number]) =>
		`<tr><td width="26" style="padding:5px 0;color:${marks[mark].colour}">${marks[mark].sign}</td>` +
		`<td width="90" style="padding:5px 0;font-size:15px">${escapeHtml(name)}</td>` +
		`<td style="padding:5px 0;font-size:15px">${escapeHtml(words)}</td></tr>`;
	return `<table role="presentation" cellpadding="0" cellspacing="0" style="margin:0 0 22px">${rows.map(row).join('')}</table>`;
}

function button({ word, href }: MailContent['button']): string {
	return (
		`<table role="presentation" cellpadding="0" cellspacing="0" style="margin:0 0 16px"><tr>` +
		`<td style="background:${buoy};border-radius:3px"><a href="${escapeHtml(href)}" ` +
		`style="display:inline-block;padding:15px 26px;color:#ffffff;font-weight:bold;font-size:16px;text-decoration:none;${sans}">` +
		`${escapeHtml(word)}</a></td></tr></table>`
	);
}

function sheet(content: MailContent): string {
	const small = `font-size:14px;line-height:20px;color:${ink2};`;
	return [
		`<p style="margin:0 0 6px;font-size:14px;color:${ink2}">${escapeHtml(content.kicker)}</p>`,
		`<h1 style="margin:0 0 16px;font-size:26px;line-height:32px;font-weight:bold">${escapeHtml(content.title)}</h1>`,
		paragraph(content.greeting),
		...content.paragraphs.map((text) => paragraph(text)),
		facts(content.facts),
		outcomes(content.outcomes),
		button(content.button),
		...content.after.map((text) => paragraph(text, small)),
		paragraph('If the button does nothing, open', `${small}margin-bottom:2px;`),
		`<p style="margin:0;font-size:14px;line-height:20px;word-break:break-all;${mono}">${escapeHtml(content.button.href)}</p>`
	].join('');
}

/** The HTML part: tables 600 px wide, system fonts, every style on its element. */
export function htmlOf(content: MailContent): string {
	return (
		`<!doctype html><html lang="en"><head><meta charset="utf-8">` +
		`<meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light">` +
		`<title>${escapeHtml(content.title)}</title></head>` +
		`<body style="margin:0;padding:0;background:${paper}">` +
		`<table role="presentation" width="100%" cellpadding="0" cellspacing="0" style="background:${paper}"><tr><td align="center" style="padding:24px 12px">` +
		`<table role="presentation" width="600" cellpadding="0" cellspacing="0" style="width:100%;max-width:600px;background:#ffffff;border:1px solid ${rule};color:${ink};font-size:16px;line-height:24px;${sans}">` +
		`<tr><td style="padding:28px 30px 26px">${sheet(content)}</td></tr>` +
		`<tr><td style="padding:16px 30px 22px;border-top:1px dashed ${rule};font-size:13px;line-height:19px;color:${ink2}">${escapeHtml(content.foot)}</td></tr>` +
		`</table></td></tr></table></body></html>`
	);
}
