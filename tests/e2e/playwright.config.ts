import { defineConfig, devices } from '@playwright/test';

/**
 * The first three draw the address bar's pop-ups in two more renderers a window, which costs more than our pages. The
 * last such switch counts, so the runner's own that matter here are said again.
 */
const switchedOff = [
	'WebUIOmniboxPopup',
	'WebUIOmniboxFullPopup',
	'WebUIOmniboxAimPopup',
	'AimEnabled',
	'HttpsFirstBalancedModeAutoEnable',
	'HttpsUpgrades',
	'MediaRouter',
	'NetworkTimeServiceQuerying',
	'OptimizationHints',
	'PaintHolding',
	'PreconnectToSearch',
	'ThirdPartyStoragePartitioning'
];

/** Debian's Chromium: nothing is downloaded, and it asks nobody outside for anything. */
const chromium = {
	executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
	args: [
		'--no-sandbox',
		'--disable-gpu',
		'--disable-quic',
		'--no-first-run',
		'--disable-background-networking',
		'--disable-component-update',
		'--disable-sync',
		`--disable-features=${switchedOff.join(',')}`
	]
};

export default defineConfig({
	testDir: '.',
	outputDir: process.env.E2E_OUTPUT,
	// The path is one story told in order; the axe run and the roles run beside it.
	fullyParallel: false,
	workers: 2,
	retries: 0,
	timeout: 120_000,
	expect: { timeout: 15_000 },
	reporter: [['line'], ['json']],
	use: {
		...devices['Desktop Chrome'],
		viewport: { width: 1440, height: 900 },
		baseURL: process.env.E2E_ADDRESS,
		launchOptions: chromium,
		locale: 'en-GB',
		actionTimeout: 15_000,
		trace: 'off'
	}
});
