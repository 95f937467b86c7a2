#version 300 es
precision highp float;

const int HIDDEN = 0;
const int LAND = 1;
const int QUALITY = 2;
const int RAIN = 3;
const int ICE = 4;
const int CALM = 5;
const int NO_DIRECTION = 6;

const float DOUBT_WEIGHT = 1.2;

uniform int u_mark;
uniform float u_size;
uniform float u_devicePx;

in vec2 v_px;
flat in float v_weight;
flat in vec3 v_ink;
out vec4 o_colour;

float fromSegment(vec2 p, vec2 a, vec2 b) {
  vec2 along = b - a;
  return length(p - a - along * clamp(dot(p - a, along) / dot(along, along), 0.0, 1.0));
}

// Distance in pixels from the edge of the mark's ink, negative inside it.
float outsideOf(vec2 p) {
  vec2 q = abs(p);
  if (u_mark == HIDDEN) return length(p) - 1.3;
  if (u_mark == LAND) return abs(max(q.x, q.y) - 3.5) - 0.5 * DOUBT_WEIGHT;
  if (u_mark == QUALITY) return fromSegment(q, vec2(0.0), vec2(3.2)) - 0.5 * DOUBT_WEIGHT;
  if (u_mark == RAIN) return abs(length(p) - 5.2) - 0.5 * DOUBT_WEIGHT;
  if (u_mark == ICE) {
    float slope = fromSegment(vec2(q.x, p.y), vec2(0.0, 6.0), vec2(5.4, -3.4));
    float base = fromSegment(vec2(q.x, p.y), vec2(0.0, -3.4), vec2(5.4, -3.4));
    return min(slope, base) - 0.5 * DOUBT_WEIGHT;
  }
  if (u_mark == CALM) return abs(length(p) - 2.9) - 0.5 * v_weight;
  return abs((q.x + q.y) * 0.7071 - 3.1) - 0.5 * v_weight;
}

void main() {
  float cover = clamp(0.5 - outsideOf(v_px / u_size) * u_size / u_devicePx, 0.0, 1.0);
  o_colour = vec4(v_ink * cover, cover);
}
