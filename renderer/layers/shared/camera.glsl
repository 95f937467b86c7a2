// From Web Mercator to the screen, straight down. Positions stay relative to the centre, so that single precision does.
uniform vec2 u_centre;
uniform float u_worldPx;
uniform mat2 u_turn;
uniform vec2 u_clipPerPx;

// Clip position of a Web Mercator position moved by CSS pixels to the right and up.
vec4 placeOnScreen(vec2 mercator, vec2 movedPx) {
  vec2 apart = mercator - u_centre;
  vec2 px = u_turn * vec2(apart.x, -apart.y) * u_worldPx + movedPx;
  return vec4(px * u_clipPerPx, 0.0, 1.0);
}
