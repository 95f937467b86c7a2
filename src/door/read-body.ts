import { Problem } from '../problems/problem.ts';

/** The whole body of a request. Throws 'refused' as soon as it proves longer than `mostBytes`, whatever its header said. */
export async function readBody(request: Request, mostBytes: number): Promise<ArrayBuffer> {
  const stated = Number(request.headers.get('content-length') ?? 0);
  if (stated > mostBytes) throw tooLong(mostBytes);
  const parts: Uint8Array[] = [];
  let length = 0;
  for await (const part of request.body ?? []) {
    length += part.byteLength;
    if (length > mostBytes) throw tooLong(mostBytes);
    parts.push(part);
  }
  const whole = new Uint8Array(length);
  let offset = 0;
  for (const part of parts) {
    whole.set(part, offset);
    offset += part.byteLength;
  }
  return whole.buffer;
}

function tooLong(mostBytes: number): Problem {
  return new Problem('refused', `This is longer than the ${mostBytes} bytes that are accepted here.`);
}
