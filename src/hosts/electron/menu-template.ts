import type { MenuItemConstructorOptions } from 'electron';
import type { NewsLine } from '../../contract/news.ts';

type Wish = Extract<NewsLine, { kind: 'asked by the desktop' }>['what'];

/** What a menu item can set off. */
export interface MenuActions {
  /** Lets the user choose files and loads them. */
  openFiles(): void;
  /** Asks the page for something only it can do. */
  askPage(wish: Exclude<Wish, 'choose files'>): void;
}

/** The menu. Reload and developer tools are left out: nothing a user needs is there. */
export function makeMenuTemplate(actions: MenuActions, platform: NodeJS.Platform): MenuItemConstructorOptions[] {
  const file: MenuItemConstructorOptions = {
    label: '&File',
    submenu: [
      { label: '&Open swath files…', accelerator: 'CmdOrCtrl+O', click: () => actions.openFiles() },
      { type: 'separator' },
      { label: '&Print…', accelerator: 'CmdOrCtrl+P', click: () => actions.askPage('print') },
      ...(platform === 'darwin' ? [] : [{ type: 'separator' } as const, { role: 'quit' } as const]),
    ],
  };
  const view: MenuItemConstructorOptions = {
    label: '&View',
    submenu: [
      { label: '&Day light', click: () => actions.askPage('day') },
      { label: 'D&usk light', click: () => actions.askPage('dusk') },
      { label: '&Night light', click: () => actions.askPage('night') },
      { type: 'separator' },
      { role: 'togglefullscreen' },
    ],
  };
  const menus: MenuItemConstructorOptions[] = [file, { role: 'editMenu' }, view];
  return platform === 'darwin' ? [{ role: 'appMenu' }, ...menus] : menus;
}
