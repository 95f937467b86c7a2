#version 300 es
in vec2 a_mercator;

void main() {
  gl_Position = placeOnScreen(a_mercator, vec2(0.0));
}
