import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { app, BrowserWindow, dialog, Menu } from 'electron';
import { createAnswer } from '../../door/answer.ts';
import type { Desk } from '../../operations/desk.ts';
import { loadDemonstrationIfUnused, openOwnDesk } from '../shared/open-own-desk.ts';
import { type MenuActions, makeMenuTemplate } from './menu-template.ts';
import { OWN_SCHEME, PAGE_ADDRESS } from './own-address.ts';
import { guardSession } from './policies.ts';
import { createSchemeHandler } from './scheme-handler.ts';
import { windowOptions } from './window-options.ts';

/** The folder that holds package.json, assets/ and dist/. */
const projectFolder = app.getAppPath();

openApplication().catch((thrown: Error) => {
  dialog.showErrorBox('Crosstrack could not start', thrown.message);
  app.exit(1);
});

async function openApplication(): Promise<void> {
  const desk = openOwnDesk({
    projectFolder,
    archivePath: process.argv.find((argument) => argument.startsWith('--archive='))?.slice('--archive='.length),
    workerUrl: pathToFileURL(join(projectFolder, 'dist', 'main', 'load-worker.js')),
  });
  endTogether(desk);
  const window = openWindow(desk);
  Menu.setApplicationMenu(Menu.buildFromTemplate(makeMenuTemplate(listActions(desk, window), process.platform)));
  if (!process.argv.includes('--no-demonstration')) await loadDemonstrationIfUnused(desk);
  await window.loadURL(PAGE_ADDRESS);
}

function openWindow(desk: Desk): BrowserWindow {
  const window = new BrowserWindow(windowOptions);
  const { session, id } = window.webContents;
  const answer = createAnswer(desk, { staticFolder: join(projectFolder, 'dist', 'renderer') });
  guardSession(session, (contentsId) => contentsId === id);
  session.protocol.handle(OWN_SCHEME, createSchemeHandler(answer));
  window.once('ready-to-show', () => window.show());
  app.on('second-instance', () => {
    if (window.isMinimized()) window.restore();
    window.focus();
  });
  return window;
}

function listActions(desk: Desk, window: BrowserWindow): MenuActions {
  return {
    async openFiles() {
      const { filePaths } = await dialog.showOpenDialog(window, { properties: ['openFile', 'multiSelections'] });
      if (filePaths.length > 0) await desk.perform('loadPaths', { paths: filePaths });
    },
    askPage: (what) => desk.say({ kind: 'asked by the desktop', what }),
  };
}

/** The application ends with its window, and the archive is closed before it does. */
function endTogether(desk: Desk): void {
  app.on('window-all-closed', () => app.quit());
  app.once('will-quit', (event) => {
    event.preventDefault();
    desk.close().finally(() => app.exit(0));
  });
}
