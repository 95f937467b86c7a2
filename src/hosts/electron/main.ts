import { app, protocol } from 'electron';
import { guardApp } from './policies.ts';
import { ownScheme, quietSwitches } from './window-options.ts';

// All of this must stand before the app is ready.
app.enableSandbox();
for (const [name, value] of quietSwitches) app.commandLine.appendSwitch(name, value);
protocol.registerSchemesAsPrivileged([ownScheme]);
guardApp(app);

// A second start hands over to the first. Never await readiness at the top level: Electron then waits for us in turn.
if (app.requestSingleInstanceLock()) void app.whenReady().then(() => import('./boot.ts'));
else app.quit();
