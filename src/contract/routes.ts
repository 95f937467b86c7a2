/**
 * The addresses of the door, the same in every host. Anything else on the origin is a static file of the renderer.
 *
 *   POST /ask/NAME               JSON input -> {answer} or, with status 4xx or 5xx, {problem: {code, message, where}}
 *   GET  /bytes/blocks?ids=1,2   one ArrayBuffer (packed-swath.ts), in the order asked; unknown ids are left out
 *   GET  /news                   newline-delimited JSON (news.ts), open until either side ends it
 *   POST /give/file?name=NAME    the bytes of a file to load -> {answer: {taskId}}; fates come as news
 */
export const routes = { ask: '/ask/', blocks: '/bytes/blocks', news: '/news', give: '/give/file' } as const;

/** The header that carries the launch token where the host asks for one. */
export const TOKEN_HEADER = 'x-crosstrack-token';

/** The most block ids one request may name. */
export const MOST_BLOCKS_PER_REQUEST = 500;

/** The largest file that may be given, bytes. */
export const LARGEST_FILE_BYTES = 512 * 1024 * 1024;
