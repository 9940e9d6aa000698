import { describe, expect, it } from 'vitest';
import { renderMail, type MailContent } from './layout';
import { wrapped } from './layout-text';

const content: MailContent = {
	kicker: 'Pell Staithe · notice N-26-0212',
	title: 'Excursions on your load',
	greeting: 'Dear Lucía Ferrán,',
	paragraphs: [
		'One logger was outside the limits three times. These are readings; they do not say whose fault it was.'
	],
	facts: [
		{ label: 'Docket, order', value: 'PS-26-1184, 450-22817', isFigure: true },
		{ label: 'Lowest', value: '−1.1 °C, limit −0.5 °C', isFigure: true }
	],
	outcomes: [
		{ mark: 'accept', name: 'Line 1', words: 'accepted' },
		{ mark: 'reject', name: 'Line 3', words: 'rejected, 640 cases' }
	],
	button: { word: 'See the evidence and answer', href: 'https://pell.example/link/abc?x=1&y=2' },
	after: ['Please answer by Fri 10 Apr, 17:00 CEST.'],
	foot: 'Sent by Pell Staithe because you shipped this load.'
};

describe('a mail', () => {
	it('says the same in both parts', () => {
		const { html, text } = renderMail(content);
		const shown = html.replace(/<[^>]+>/g, ' ').replace(/&amp;/g, '&');
		for (const said of [
			'PS-26-1184, 450-22817',
			'−1.1 °C, limit −0.5 °C',
			'rejected, 640 cases',
			'https://pell.example/link/abc?x=1&y=2',
			'Dear Lucía Ferrán,',
			'Please answer by Fri 10 Apr, 17:00 CEST.',
			'Sent by Pell Staithe because you shipped this load.'
		]) {
			expect(shown).toContain(said);
			expect(text).toContain(said);
		}
	});

	it('reads with images, style sheets and scripts off, within 600 px', () => {
		const { html } = renderMail(content);
		expect(html).not.toMatch(/<(img|style|script|link)\b/);
		expect(html).toContain('max-width:600px');
		expect(html.match(/<a /g)).toHaveLength(1);
	});

	it('makes names harmless', () => {
		const { html } = renderMail({
			...content,
			greeting: 'Dear <b onclick="x">O\'Neill & Sons</b>,',
			button: { word: 'Open', href: 'https://pell.example/"onmouseover="x' }
		});
		expect(html).toContain('&lt;b onclick=&quot;x&quot;&gt;O&#39;Neill &amp; Sons');
		expect(html).not.toContain('"onmouseover="');
	});

	it('lines figures up in the text part and leaves out what there is none of', () => {
		const { text } = renderMail({ ...content, outcomes: undefined });
		expect(text).toContain('Docket, order   PS-26-1184');
		expect(text).toContain('Lowest          −1.1 °C');
		expect(text).not.toContain('Line 3');
		expect(renderMail({ ...content, facts: [] }).html).not.toContain('Docket, order');
	});

	it('breaks text at spaces and never within an address', () => {
		expect(wrapped('one two three', 7)).toBe('one two\nthree');
		const address = `https://pell.example/${'a'.repeat(90)}`;
		expect(wrapped(`see ${address} now`, 40)).toBe(`see\n${address}\nnow`);
	});
});
