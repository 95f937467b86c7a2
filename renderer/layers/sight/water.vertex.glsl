#version 300 es
// One triangle over the whole view.
uniform vec2 u_halfPx;
out vec2 v_px;

void main() {
  vec2 corner = vec2(gl_VertexID == 1 ? 3.0 : -1.0, gl_VertexID == 2 ? 3.0 : -1.0);
  v_px = corner * u_halfPx;
  gl_Position = vec4(corner, 0.0, 1.0);
}
