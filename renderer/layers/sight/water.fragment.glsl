#version 300 es
precision highp float;

const float LINE_HALF_WIDTH = 0.5;
const float LINE_STRENGTH = 0.55;
const float EDGE_STRENGTH = 0.7;
const float DOT_RADIUS = 0.85;

uniform sampler2D u_seen;
uniform vec2 u_shift;
uniform vec3 u_sea;
uniform vec3 u_unseen;
uniform vec3 u_hatch;
uniform float u_devicePx;
uniform float u_linePx;
uniform float u_dotPx;
// Every other line and dot fades in as zooming in draws the rest apart, so that the pattern never jumps.
uniform float u_between;

in float v_line;
in vec2 v_dot;
out vec4 o_colour;

float hatchCover() {
  float nearest = floor(v_line + 0.5);
  float cover = clamp(0.5 + (LINE_HALF_WIDTH - abs(v_line - nearest) * u_linePx) / u_devicePx, 0.0, 1.0);
  return fract(nearest * 0.5) > 0.25 ? cover * u_between : cover;
}

float stippleCover() {
  vec2 nearest = floor(v_dot + 0.5);
  float cover = clamp(0.5 + (DOT_RADIUS - length(v_dot - nearest) * u_dotPx) / u_devicePx, 0.0, 1.0);
  vec2 odd = fract(nearest * 0.5);
  return odd.x + odd.y > 0.25 ? cover * u_between : cover;
}

void main() {
  // The mean of four texels: smooths the mask's steps for the price of one look.
  vec2 mask = texture(u_seen, (gl_FragCoord.xy + u_shift + 0.5) / vec2(textureSize(u_seen, 0))).rg;
  float seen = mask.r;
  vec3 water = u_sea;
  if (mask.g > 0.0) water = mix(u_sea, u_hatch, mask.g * stippleCover());
  if (seen < 1.0) {
    vec3 unseen = mix(u_unseen, u_hatch, LINE_STRENGTH * hatchCover());
    // A fine line where sight ends, strongest where the four are half seen.
    water = mix(mix(unseen, water, seen), u_hatch, EDGE_STRENGTH * (1.0 - abs(2.0 * seen - 1.0)));
  }
  o_colour = vec4(water, 1.0);
}
