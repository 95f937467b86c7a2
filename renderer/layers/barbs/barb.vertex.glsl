#version 300 es
// One piece, a stroke or a pennant, of every barb of a run: a quad each, four vertices, pulled from the texture.
precision highp usampler2D;

const int ROW_BITS = 11;

uniform float u_devicePx;
uniform float u_size;
uniform usampler2D u_winds;
uniform int u_first;
// Ends of the piece, and for a pennant half the width of its base; 0 for a stroke.
uniform vec4 u_piece;
uniform float u_baseHalf;
uniform float u_weight[6];
uniform vec3 u_ink[6];

// Position in the piece: along it from its middle, across it, and how wide it is there to one side.
out vec3 v_at;
flat out float v_halfLength;
flat out vec3 v_ink;

void main() {
  int entry = u_first + (gl_VertexID >> 2);
  uvec4 words = texelFetch(u_winds, ivec2(entry & ((1 << ROW_BITS) - 1), entry >> ROW_BITS), 0);
  int ink = int(words.w & 7u);
  float side = (words.w & 8u) == 0u ? 1.0 : -1.0;

  vec2 middle = 0.5 * u_size * (u_piece.xy + u_piece.zw);
  vec2 reach = 0.5 * u_size * (u_piece.zw - u_piece.xy);
  v_halfLength = length(reach);
  vec2 ahead = reach / v_halfLength;
  bool isPennant = u_baseHalf > 0.0;
  float halfWidth = isPennant ? u_baseHalf * u_size : 0.5 * u_weight[ink];
  // Half a device pixel past the edge, where the cover of a pixel comes to nothing.
  float margin = 0.5 * u_devicePx;
  float along = (gl_VertexID & 1) == 0 ? -1.0 : 1.0;
  float across = (gl_VertexID & 2) == 0 ? -1.0 : 1.0;
  v_at.x = along * (v_halfLength + margin + (isPennant ? 0.0 : halfWidth));
  v_at.y = across * (halfWidth + margin);
  v_at.z = isPennant ? halfWidth * 0.5 * (1.0 - v_at.x / v_halfLength) : halfWidth;
  vec2 local = middle + ahead * v_at.x + vec2(-ahead.y, ahead.x) * v_at.y;

  // Up the shaft, and from it towards the side of the feathers: clockwise in the north, the other way in the south.
  vec2 up = u_turn * unpackSnorm2x16(words.z);
  vec2 feathers = side * vec2(up.y, -up.x);
  gl_Position = placeOnScreen(uintBitsToFloat(words.xy), local.x * feathers + local.y * up);
  v_ink = u_ink[ink];
}
