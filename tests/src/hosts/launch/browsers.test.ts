import { expect, test } from 'vitest';
import { findBrowser, hasDisplay, type Machine } from '../../../../src/hosts/launch/browsers.ts';

// Where browsers lie: common practice of each platform's packages, no source.

function machine(platform: NodeJS.Platform, variables: Machine['variables'], ...present: string[]): Machine {
  return { platform, variables, exists: (path) => present.includes(path.replaceAll('\\', '/')) };
}

test('takes the first browser by PATH', () => {
  const here = machine('linux', { PATH: '/opt/a:/opt/b' }, '/opt/b/chromium', '/usr/bin/google-chrome');
  expect(findBrowser(here)).toBe('/opt/b/chromium');
});

test('looks in the usual places where PATH has none', () => {
  const here = machine('linux', { PATH: '/opt/a' }, '/snap/bin/chromium');
  expect(findBrowser(here)).toBe('/snap/bin/chromium');
});

test('knows where macOS keeps its applications', () => {
  const path = '/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge';
  expect(findBrowser(machine('darwin', {}, path))).toBe(path);
});

test('knows where Windows keeps its programs', () => {
  const path = 'C:/Programs/Google/Chrome/Application/chrome.exe';
  const here = machine('win32', { PROGRAMFILES: 'C:/Programs' }, path);
  expect(findBrowser(here)?.replaceAll('\\', '/')).toBe(path);
});

test('takes the browser the user names, and no other in its place', () => {
  const variables = { PATH: '/usr/bin', CROSSTRACK_BROWSER: '/opt/mine' };
  expect(findBrowser(machine('linux', variables, '/usr/bin/chromium', '/opt/mine'))).toBe('/opt/mine');
  expect(findBrowser(machine('linux', variables, '/usr/bin/chromium'))).toBeUndefined();
});

test('finds none where there is none', () => {
  expect(findBrowser(machine('linux', { PATH: '/usr/bin' }))).toBeUndefined();
});

test('sees a display on Linux only where one is named', () => {
  expect(hasDisplay(machine('linux', {}))).toBe(false);
  expect(hasDisplay(machine('linux', { DISPLAY: ':0' }))).toBe(true);
  expect(hasDisplay(machine('linux', { WAYLAND_DISPLAY: 'wayland-0' }))).toBe(true);
  expect(hasDisplay(machine('darwin', {}))).toBe(true);
});
