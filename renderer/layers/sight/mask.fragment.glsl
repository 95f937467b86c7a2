#version 300 es
precision highp float;

// Red: seen. Green: seen without a wind. Written opaque, so that overlapping passes add up to nothing new.
uniform float u_noWind;
out vec4 o_seen;

void main() {
  o_seen = vec4(1.0, u_noWind, 0.0, 1.0);
}
