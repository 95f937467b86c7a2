#version 300 es
// A square about each position, in which the fragment shader draws the mark.
precision highp usampler2D;

const int ROW_BITS = 11;
// Corners 0 1 2 and 2 1 3 of a square, two bits each.
const int CORNERS = 3492;

uniform float u_reach;
uniform usampler2D u_winds;
uniform int u_first;
uniform float u_weight[6];
uniform vec3 u_ink[6];

out vec2 v_px;
flat out float v_weight;
flat out vec3 v_ink;

void main() {
  int wind = gl_VertexID / 6;
  int corner = gl_VertexID - wind * 6;
  int entry = u_first + wind;
  uvec4 words = texelFetch(u_winds, ivec2(entry & ((1 << ROW_BITS) - 1), entry >> ROW_BITS), 0);
  int which = CORNERS >> (corner * 2);
  v_px = u_reach * vec2((which & 1) == 0 ? -1.0 : 1.0, (which & 2) == 0 ? -1.0 : 1.0);
  gl_Position = placeOnScreen(uintBitsToFloat(words.xy), v_px);
  int ink = int(words.w & 7u);
  v_weight = u_weight[ink];
  v_ink = u_ink[ink];
}
