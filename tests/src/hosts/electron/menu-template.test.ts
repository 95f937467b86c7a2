import type { MenuItemConstructorOptions } from 'electron';
import { expect, test } from 'vitest';
import { makeMenuTemplate } from '../../../../src/hosts/electron/menu-template.ts';

function listItems(platform: NodeJS.Platform, done: string[] = []): MenuItemConstructorOptions[] {
  const actions = { openFiles: () => done.push('open'), askPage: (wish: string) => done.push(wish) };
  return makeMenuTemplate(actions, platform).flatMap((menu) => [menu, ...((menu.submenu ?? []) as never[])]);
}

test('opens files, prints and changes the light by its items', () => {
  const done: string[] = [];
  for (const item of listItems('linux', done)) item.click?.({} as never, undefined, {} as never);
  expect(done).toEqual(['open', 'print', 'day', 'dusk', 'night']);
});

test.each(['linux', 'win32', 'darwin'] as const)('has one way to quit, on %s', (platform) => {
  const roles = listItems(platform).map((item) => item.role);
  expect(roles.filter((role) => role === 'quit' || role === 'appMenu')).toHaveLength(1);
});

test('offers no developer tools and no reload', () => {
  const roles = listItems('linux').map((item) => item.role);
  for (const role of ['toggleDevTools', 'reload', 'forceReload', 'viewMenu']) expect(roles).not.toContain(role);
});
