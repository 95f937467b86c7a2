/** A linked program and where its uniforms stand. */
export interface Program {
  program: WebGLProgram;
  /** The place of a uniform; null of one the program does not use, which WebGL then passes over. */
  at(uniform: string): WebGLUniformLocation | null;
}

/** Compiles and links a program of GLSL ES 3.00. Throws with the driver's words when it cannot. */
export function linkProgram(gl: WebGL2RenderingContext, vertexSource: string, fragmentSource: string): Program {
  const program = gl.createProgram();
  for (const [kind, source] of [
    [gl.VERTEX_SHADER, vertexSource],
    [gl.FRAGMENT_SHADER, fragmentSource],
  ] as const) {
    const shader = gl.createShader(kind);
    if (!shader) throw new Error('the graphics context is lost');
    gl.shaderSource(shader, source);
    gl.compileShader(shader);
    gl.attachShader(program, shader);
    gl.deleteShader(shader);
  }
  gl.linkProgram(program);
  if (!gl.getProgramParameter(program, gl.LINK_STATUS) && !gl.isContextLost()) {
    const logs = gl.getAttachedShaders(program)?.map((shader) => gl.getShaderInfoLog(shader));
    throw new Error(`a shader does not compile: ${[...(logs ?? []), gl.getProgramInfoLog(program)].join('\n')}`);
  }
  const places = new Map<string, WebGLUniformLocation | null>();
  return {
    program,
    at(uniform) {
      let place = places.get(uniform);
      if (place === undefined) {
        place = gl.getUniformLocation(program, uniform);
        places.set(uniform, place);
      }
      return place;
    },
  };
}

/** A colour token '#rrggbb' as red, green and blue, 0 to 1. */
export function parseColour(token: string): [number, number, number] {
  const bits = Number.parseInt(token.slice(1), 16);
  return [((bits >> 16) & 255) / 255, ((bits >> 8) & 255) / 255, (bits & 255) / 255];
}
