import { defineConfig, devices } from '@playwright/test';

const { E2E_BASE_URL, CHROMIUM_PATH } = process.env;

export default defineConfig({
	testDir: './e2e',
	testMatch: '*.e2e.ts',
	outputDir: '../test-results/e2e',
	workers: 1,
	// a browser on a busy machine may be late once
	retries: 1,
	forbidOnly: true,
	timeout: 60_000,
	expect: { timeout: 10_000 },
	use: {
		baseURL: E2E_BASE_URL ?? 'http://localhost:3000',
		locale: 'en-US',
		timezoneId: 'America/Chicago',
		trace: 'retain-on-failure',
		actionTimeout: 10_000,
		// It keeps pages of its own, and what passes it cannot be held up by a test; its journey allows it.
		serviceWorkers: 'block',
		launchOptions: {
			...(CHROMIUM_PATH ? { executablePath: CHROMIUM_PATH } : {}),
			args: ['--no-sandbox']
		}
	},
	projects: [
		{
			name: 'phone',
			use: {
				userAgent: devices['Pixel 7'].userAgent,
				viewport: { width: 390, height: 844 },
				deviceScaleFactor: 2,
				isMobile: true,
				hasTouch: true
			}
		}
	]
});
