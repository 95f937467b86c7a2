#version 300 es
precision highp float;

// Lines and dots lie on the earth: they keep still under a pan and turn with the map. From one whole zoom to the next
// they draw apart to twice their step while others fade in between, so they never jump.
const float LINE_WIDTH = 1.0;
const float LINE_STRENGTH = 0.55;
const float EDGE_STRENGTH = 0.7;
const float DOT_RADIUS = 0.85;

uniform sampler2D u_seen;
uniform vec3 u_sea;
uniform vec3 u_unseen;
uniform vec3 u_hatch;
uniform vec3 u_stipple;
uniform mat2 u_toEarth;
uniform float u_devicePx;
uniform float u_between;
uniform float u_lineStep;
uniform float u_linePhase;
uniform float u_dotStep;
uniform vec2 u_dotPhase;

in vec2 v_px;
out vec4 o_colour;

float lineCover(float at, float step) {
  float distance = abs(at - step * floor(at / step + 0.5));
  return clamp(0.5 + (0.5 * LINE_WIDTH - distance) / u_devicePx, 0.0, 1.0);
}

float hatchCover(vec2 earthPx) {
  float at = (earthPx.x - earthPx.y) * 0.70710678 + u_linePhase;
  return max(lineCover(at, u_lineStep), u_between * lineCover(at + 0.5 * u_lineStep, u_lineStep));
}

float stippleCover(vec2 earthPx) {
  float step = 0.5 * u_dotStep;
  vec2 at = (earthPx + u_dotPhase) / step;
  vec2 nearest = floor(at + 0.5);
  float cover = clamp(0.5 + (DOT_RADIUS - length(at - nearest) * step) / u_devicePx, 0.0, 1.0);
  vec2 odd = nearest - 2.0 * floor(nearest * 0.5);
  return odd == vec2(0.0) ? cover : cover * u_between;
}

// A fine line where sight ends: strongest where a pixel and its neighbours are half seen.
float edgeCover(ivec2 at, float seen) {
  ivec2 last = textureSize(u_seen, 0) - 1;
  float around = texelFetch(u_seen, min(at + ivec2(1, 0), last), 0).r + texelFetch(u_seen, max(at - ivec2(1, 0), 0), 0).r +
                 texelFetch(u_seen, min(at + ivec2(0, 1), last), 0).r + texelFetch(u_seen, max(at - ivec2(0, 1), 0), 0).r;
  return 1.0 - abs(2.0 * (around + 2.0 * seen) / 6.0 - 1.0);
}

void main() {
  ivec2 at = ivec2(gl_FragCoord.xy);
  vec2 seen = texelFetch(u_seen, at, 0).rg;
  vec2 earthPx = u_toEarth * v_px;
  vec3 unseen = mix(u_unseen, u_hatch, LINE_STRENGTH * hatchCover(earthPx));
  vec3 sea = mix(u_sea, u_stipple, seen.g * stippleCover(earthPx));
  vec3 water = mix(unseen, sea, seen.r);
  o_colour = vec4(mix(water, u_hatch, EDGE_STRENGTH * edgeCover(at, seen.r)), 1.0);
}
