/** `npm run serve`: the built product on its port, with the jobs that run beside it. Needs DATABASE_URL. */
import { createServer } from 'node:http';
import { join } from 'node:path';

const root = join(import.meta.dirname, '../..');
process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = 'true';
process.env.NODE_ENV ??= 'production';
// The adapter believes https unless told; this server tells it the truth on every request.
process.env.PROTOCOL_HEADER = 'x-forwarded-proto';
process.env.HOST_HEADER = process.env.TRUST_PROXY === 'true' ? 'x-forwarded-host' : 'host';
process.env.BODY_SIZE_LIMIT ??= '60M';
const isProxyTrusted = process.env.TRUST_PROXY === 'true';
if (isProxyTrusted) process.env.ADDRESS_HEADER ??= 'x-forwarded-for';
// A fixed ORIGIN would forbid localhost beside 127.0.0.1; links in mail use it, requests do not.
const origin = process.env.ORIGIN;
delete process.env.ORIGIN;

const { startBackground } = await import(join(root, 'build/node/background.js'));
/** @type {{ stop: () => Promise<void> }} */
const background = await startBackground({ ...process.env, ORIGIN: origin }).catch(
	(/** @type {unknown} */ error) => {
		process.stderr.write(`${error instanceof Error ? error.message : error}\n`);
		process.exit(1);
	}
);
process.env.PUBLIC_ORIGIN = origin ?? '';
const { handler } = await import(join(root, 'build/handler.js'));

const server = createServer((request, response) => {
	if (!isProxyTrusted) request.headers['x-forwarded-proto'] = 'http';
	handler(request, response, () => response.writeHead(404).end());
});
// An upload of 50 MB over a dock's Wi-Fi takes its time.
server.requestTimeout = 15 * 60_000;
// Longer than any client or proxy keeps an idle connection: it must not be cut while their next request is on its way.
server.keepAliveTimeout = 75_000;
server.headersTimeout = 80_000;
const port = Number(process.env.PORT || 3000);
server.on('error', (error) => {
	process.stderr.write(`Port ${port} cannot be opened: ${error.message}. Choose another with PORT.\n`);
	process.exit(1);
});
server.listen(port, process.env.HOST || '127.0.0.1');

let isStopping = false;
async function stop() {
	if (isStopping) return;
	isStopping = true;
	const closed = new Promise((resolve) => server.close(resolve));
	server.closeIdleConnections();
	const giveUp = setTimeout(() => server.closeAllConnections(), 5_000);
	await closed;
	clearTimeout(giveUp);
	await background.stop();
	process.exit(0);
}
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => void stop());
