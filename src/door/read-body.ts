/** The whole body of a request; null as soon as it proves longer than `mostBytes`, whatever its header said. */
export async function readBody(request: Request, mostBytes: number): Promise<ArrayBuffer | null> {
  const stated = Number(request.headers.get('content-length') ?? 0);
  if (stated > mostBytes) return null;
  const parts: Uint8Array[] = [];
  let length = 0;
  for await (const part of request.body ?? []) {
    length += part.byteLength;
    if (length > mostBytes) return null;
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
