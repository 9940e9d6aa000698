import { describe, expect, it } from 'vitest';
import { buildPartner, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { env } from '../env';
import { startMailbox } from './local-mailbox';
import { getMail, linkedText, listMails } from './read-mailbox';
import { sendMail } from './send-mail';

useTestDatabase();
const port = 42_000 + (process.pid % 20_000);
Object.assign(process.env, { LOCAL_MAILBOX_PORT: String(port), ORIGIN: 'https://pell.example' });

describe('the local mailbox', () => {
	it('shows staff what was sent, newest first, and suppliers nothing', async () => {
		const mailbox = await startMailbox(env().mailFolder, port);
		for (const subject of ['First', 'Second'])
			await sendMail({
				to: { name: 'Lucía Ferrán', address: 'quality@olmarisa.example' },
				fromName: 'Pell Staithe',
				subject,
				html: `<p>${subject}</p>`,
				text: subject,
				messageId: `<${subject}@pell.example>`
			});
		await mailbox.stop();

		const dock = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		const mails = await listMails(dock);
		expect(mails.map(({ subject }) => subject)).toEqual(['Second', 'First']);
		const mail = await getMail(dock, mails[0]?.id ?? '');
		expect(mail).toMatchObject({ text: 'Second', html: '<p>Second</p>' });
		expect(mail.to).toContain('quality@olmarisa.example');
		await expect(getMail(dock, dock.actor.id)).rejects.toMatchObject({ code: 'not-found' });
		await expect(getMail(dock, '../../etc/passwd')).rejects.toMatchObject({ code: 'not-found' });

		const supplier = await contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
		await expect(listMails(supplier)).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(getMail(supplier, mails[0]?.id ?? '')).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('makes links of our own addresses only', () => {
		expect(linkedText('Sign in:\nhttps://pell.example/link/aB-9_\nnot https://pell.example.evil/x')).toEqual([
			{ text: 'Sign in:\n', href: null },
			{ text: 'https://pell.example/link/aB-9_', href: 'https://pell.example/link/aB-9_' },
			{ text: '\nnot https://pell.example.evil/x', href: null }
		]);
	});
});
