#version 300 es
// A square about each position, in which the fragment shader draws the mark.
precision highp usampler2D;

const int ROW_BITS = 11;

uniform float u_reach;
uniform usampler2D u_winds;
uniform int u_first;
uniform float u_weight[6];
uniform vec3 u_ink[6];

out vec2 v_px;
flat out float v_weight;
flat out vec3 v_ink;

void main() {
  int entry = u_first + (gl_VertexID >> 2);
  uvec4 words = texelFetch(u_winds, ivec2(entry & ((1 << ROW_BITS) - 1), entry >> ROW_BITS), 0);
  v_px = u_reach * vec2((gl_VertexID & 1) == 0 ? -1.0 : 1.0, (gl_VertexID & 2) == 0 ? -1.0 : 1.0);
  gl_Position = placeOnScreen(uintBitsToFloat(words.xy), v_px);
  int ink = int(words.w & 7u);
  v_weight = u_weight[ink];
  v_ink = u_ink[ink];
}
