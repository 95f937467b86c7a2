#version 300 es
// One wind of a run is as many quads as its barb has strokes and pennants; nothing comes from attributes.
precision highp usampler2D;

const int MOST_PIECES = 24;
const int ROW_BITS = 11;
// Corners 0 1 2 and 2 1 3 of a quad, two bits each.
const int CORNERS = 3492;

uniform float u_devicePx;
uniform float u_size;
uniform usampler2D u_winds;
uniform int u_first;
uniform int u_pieces;
uniform int u_pennants;
uniform float u_pennantHalf;
uniform vec4 u_piece[MOST_PIECES];
uniform float u_weight[6];
uniform vec3 u_ink[6];

// Position in a piece: along it from its middle, across it, and how wide it is there to one side.
out vec3 v_at;
flat out float v_halfLength;
flat out float v_isPennant;
flat out vec3 v_ink;

void main() {
  int quad = gl_VertexID / 6;
  int corner = gl_VertexID - quad * 6;
  int wind = quad / u_pieces;
  int piece = quad - wind * u_pieces;
  int entry = u_first + wind;
  uvec4 words = texelFetch(u_winds, ivec2(entry & ((1 << ROW_BITS) - 1), entry >> ROW_BITS), 0);
  int ink = int(words.w & 7u);
  float side = (words.w & 8u) == 0u ? 1.0 : -1.0;

  vec4 ends = u_piece[piece] * u_size;
  vec2 middle = 0.5 * (ends.xy + ends.zw);
  vec2 reach = 0.5 * (ends.zw - ends.xy);
  v_halfLength = length(reach);
  v_isPennant = piece < u_pennants ? 1.0 : 0.0;
  float halfWidth = v_isPennant > 0.5 ? u_pennantHalf * u_size : 0.5 * u_weight[ink];
  float margin = u_devicePx;
  int which = CORNERS >> (corner * 2);
  float along = (which & 1) == 0 ? -1.0 : 1.0;
  float across = (which & 2) == 0 ? -1.0 : 1.0;
  v_at.x = along * (v_halfLength + (v_isPennant > 0.5 ? margin : halfWidth + margin));
  v_at.y = across * (halfWidth + margin);
  v_at.z = v_isPennant > 0.5 ? halfWidth * 0.5 * (1.0 - v_at.x / v_halfLength) : halfWidth;
  vec2 ahead = reach / v_halfLength;
  vec2 local = middle + ahead * v_at.x + vec2(-ahead.y, ahead.x) * v_at.y;

  // Up the shaft, and from it towards the side of the feathers: clockwise in the north, the other way in the south.
  vec2 up = u_turn * unpackSnorm2x16(words.z);
  vec2 feathers = side * vec2(up.y, -up.x);
  gl_Position = placeOnScreen(uintBitsToFloat(words.xy), local.x * feathers + local.y * up);
  v_ink = u_ink[ink];
}
