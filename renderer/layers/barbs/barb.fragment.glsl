#version 300 es
precision highp float;

uniform float u_devicePx;
uniform float u_baseHalf;

in vec3 v_at;
flat in float v_halfLength;
flat in vec3 v_ink;
out vec4 o_colour;

void main() {
  float beyond = abs(v_at.x) - v_halfLength;
  // Strokes end round, pennants flat against the shaft.
  float outside = u_baseHalf > 0.0 ? max(abs(v_at.y) - v_at.z, beyond)
                                   : length(vec2(max(beyond, 0.0), v_at.y)) - v_at.z;
  float cover = clamp(0.5 - outside / u_devicePx, 0.0, 1.0);
  o_colour = vec4(v_ink * cover, cover);
}
