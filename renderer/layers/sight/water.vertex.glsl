#version 300 es
// One triangle over the whole view. Lines and dots lie on the earth: they keep still under a pan and turn with the map.
precision highp float;

uniform vec2 u_halfPx;
uniform mat2 u_toEarth;
uniform float u_linePx;
uniform float u_linesAtCentre;
uniform float u_dotPx;
uniform vec2 u_dotsAtCentre;

// Where a pixel lies among the hatch lines and among the dots, counted in steps.
out float v_line;
out vec2 v_dot;

void main() {
  vec2 corner = vec2(gl_VertexID == 1 ? 3.0 : -1.0, gl_VertexID == 2 ? 3.0 : -1.0);
  vec2 earthPx = u_toEarth * (corner * u_halfPx);
  v_line = (earthPx.x - earthPx.y) * 0.70710678 / u_linePx + u_linesAtCentre;
  v_dot = earthPx / u_dotPx + u_dotsAtCentre;
  gl_Position = vec4(corner, 0.0, 1.0);
}
