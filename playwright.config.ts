import { execFileSync } from 'node:child_process';
import { defineConfig, devices } from '@playwright/test';

// Chosen once, in the first process that reads this file; the workers inherit it.
process.env['LEAFHALT_E2E_PORT'] ??= execFileSync(process.execPath, [
  '-e', "const s=require('net').createServer().listen(0,'127.0.0.1',()=>{console.log(s.address().port);s.close()})",
]).toString().trim();

export default defineConfig({
  testDir: 'tests/e2e',
  workers: 1,
  forbidOnly: true,
  reporter: process.env['LEAFHALT_E2E_REPORT'] ? [['list'], ['json', { outputFile: process.env['LEAFHALT_E2E_REPORT'] }]] : 'list',
  timeout: 90_000,
  expect: { timeout: 15_000 }, // a busy machine is easily twice as slow
  globalSetup: './tests/support/browser-setup.ts',
  use: {
    baseURL: `http://127.0.0.1:${process.env['LEAFHALT_E2E_PORT']}`,
    trace: 'retain-on-failure', // no video: it needs a downloaded ffmpeg
    permissions: ['camera'],
    locale: 'en-US',
    launchOptions: {
      executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
      args: [
        '--use-fake-device-for-media-stream',
        '--use-fake-ui-for-media-stream',
        '--use-file-for-fake-video-capture=.tmp/camera.y4m',
        '--enable-unsafe-swiftshader', // WebGL without a graphics card
      ],
    },
  },
  projects: [
    { name: 'desk', use: { ...devices['Desktop Chrome'], viewport: { width: 1280, height: 800 } }, grepInvert: /@phone/ },
    { name: 'phone', use: { ...devices['Pixel 7'], viewport: { width: 390, height: 844 } }, grep: /@phone/ },
  ],
});
