import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { ownScheme, windowOptions } from '../../../../src/hosts/electron/window-options.ts';

// What each must be: Electron's own security checklist (tutorial 'Security', items 2 to 8, 12, 18).

test('shuts the page in: sandboxed, isolated, without Node, web views or relaxed web rules', () => {
  expect(windowOptions.webPreferences).toMatchObject({
    sandbox: true,
    contextIsolation: true,
    nodeIntegration: false,
    nodeIntegrationInWorker: false,
    nodeIntegrationInSubFrames: false,
    webSecurity: true,
    allowRunningInsecureContent: false,
    experimentalFeatures: false,
    webviewTag: false,
  });
  expect(windowOptions.webPreferences).not.toHaveProperty('preload');
  expect(windowOptions.webPreferences).not.toHaveProperty('enableBlinkFeatures');
});

test('keeps the session in memory and fetches no dictionary', () => {
  expect(windowOptions.webPreferences?.partition).not.toMatch(/^persist:/);
  expect(windowOptions.webPreferences?.spellcheck).toBe(false);
});

test('gives our scheme an origin and a secure context, and no way around the content policy', () => {
  expect(ownScheme.privileges).toEqual({
    standard: true,
    secure: true,
    supportFetchAPI: true,
    stream: true,
    bypassCSP: false,
  });
});

test('never waits at the top level of the main file, where Electron would wait for us in turn', () => {
  const main = readFileSync(new URL('../../../../src/hosts/electron/main.ts', import.meta.url), 'utf8');
  expect(main).toContain("whenReady().then(() => import('./boot.ts'))");
  expect(main).not.toMatch(/^\s*await /m);
});
