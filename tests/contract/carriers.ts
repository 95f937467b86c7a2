import { TOKEN_HEADER } from '../../src/contract/routes.ts';
import { type Answer, createAnswer } from '../../src/door/answer.ts';
import { createSchemeHandler } from '../../src/hosts/electron/scheme-handler.ts';
import { startLoopback } from '../../src/hosts/loopback/start-loopback.ts';
import type { Desk } from '../../src/operations/desk.ts';

/** A way from the renderer to a desk: `fetch` as the renderer has it, with paths of its own origin. */
export interface Carried {
  fetch(path: string, init?: RequestInit): Promise<Response>;
  close(): Promise<void>;
}

/** Every way there is. Each must pass the same list (contract.test.ts). */
export const carriers: { name: string; open(desk: Desk, staticFolder: string): Promise<Carried> }[] = [
  {
    name: 'the door in memory',
    async open(desk, staticFolder) {
      const answer = createAnswer(desk, { staticFolder });
      const gone = new AbortController();
      return {
        fetch: (path, init) => answer(new Request(`http://door.test${path}`, { signal: gone.signal, ...init })),
        close: async () => gone.abort(),
      };
    },
  },
  {
    name: 'the loopback host over HTTP',
    async open(desk, staticFolder) {
      const answer: Answer = createAnswer(desk, { staticFolder });
      const { origin, token, close } = await startLoopback(answer);
      return {
        fetch: (path, init) => fetch(origin + path, { ...init, headers: { ...init?.headers, [TOKEN_HEADER]: token } }),
        close,
      };
    },
  },
  {
    name: "Electron's scheme, in memory",
    async open(desk, staticFolder) {
      const handle = createSchemeHandler(createAnswer(desk, { staticFolder }));
      const gone = new AbortController();
      return {
        fetch: (path, init) => handle(new Request(`crosstrack://desk${path}`, { signal: gone.signal, ...init })),
        close: async () => gone.abort(),
      };
    },
  },
];
