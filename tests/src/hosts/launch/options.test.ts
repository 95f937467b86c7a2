import { expect, test } from 'vitest';
import { launchHelp, readLaunchOptions } from '../../../../src/hosts/launch/options.ts';

test('asks for a window, a free port and the demonstration unless told otherwise', () => {
  expect(readLaunchOptions([])).toEqual({
    archivePath: undefined,
    isWindowWanted: true,
    port: undefined,
    isFetchAsked: false,
    isDemonstrationWanted: true,
    isHelpAsked: false,
  });
});

test('reads every option that the help names', () => {
  const named = [...launchHelp.matchAll(/^ {2}(--[a-z-]+)( [A-Z]+)?/gm)].map(([, name, value]) =>
    value === undefined ? [name] : [name, '8123'],
  );
  expect(readLaunchOptions(named.flat())).toEqual({
    archivePath: '8123',
    isWindowWanted: false,
    port: 8123,
    isFetchAsked: true,
    isDemonstrationWanted: false,
    isHelpAsked: true,
  });
});

test.each([['--port', 'harbour'], ['--port', '70000'], ['--prot', '1'], ['file.bufr']])(
  'does not take %s %s',
  (...args) => {
    expect(() => readLaunchOptions(args)).toThrow(/\w/);
  },
);
