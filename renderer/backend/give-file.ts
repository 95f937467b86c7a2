import { z } from 'zod';
import { LARGEST_FILE_BYTES, routes } from '../../src/contract/routes.ts';
import { Problem } from '../../src/problems/problem.ts';
import type { Door } from './door.ts';
import { noAnswer, toToldProblem } from './told-problem.ts';

const taskGiven = z.object({ answer: z.object({ taskId: z.number().int() }) });

/**
 * Gives a file's bytes to the host and resolves with the id of the task that reads them; what became of the file comes
 * as news. Progress is the share of bytes sent, 0 to 1. Rejects with a Problem, or with the signal's reason.
 */
export function giveFile(
  door: Door,
  file: File,
  onProgress: (share: number) => void,
  signal: AbortSignal,
): Promise<number> {
  if (file.size > LARGEST_FILE_BYTES) {
    return Promise.reject(
      new Problem('refused', `larger than ${LARGEST_FILE_BYTES / 2 ** 20} MiB`, { file: file.name }),
    );
  }
  return new Promise((resolve, reject) => {
    // fetch tells nothing of bytes sent; XMLHttpRequest does.
    const request = new XMLHttpRequest();
    request.open('POST', `${door.origin}${routes.give}?name=${encodeURIComponent(file.name)}`);
    for (const [name, value] of Object.entries(door.headers)) request.setRequestHeader(name, value);
    request.upload.onprogress = (event) => onProgress(event.total > 0 ? event.loaded / event.total : 0);
    request.onload = () => {
      const body = parseJson(request.responseText);
      const given = taskGiven.safeParse(body);
      if (request.status >= 200 && request.status < 300 && given.success) resolve(given.data.answer.taskId);
      else reject(toToldProblem(body, request.status));
    };
    request.onerror = () => reject(noAnswer('the file could not be sent'));
    request.onabort = () => reject(signal.reason);
    signal.addEventListener('abort', () => request.abort(), { once: true });
    request.send(file);
  });
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
