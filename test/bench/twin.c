/*
 * Step loops as one writes them by hand, for the planar problem: the yardstick of the generated ones.
 * The same operations in the same order, so that the results agree to the last bit.
 *
 * io: x, y, vx, vy; the state before the last step; x.v; evaluations; 0. Stops at a periapsis passage.
 */
#include <math.h>

static inline void post_newtonian(double x, double y, double vx, double vy, double GM, double k, double *ax, double *ay) {
  double s = 1 / sqrt(x * x + y * y);
  double m = GM * s;
  double g = m * s;
  double n = (x * vx + y * vy) * s;
  double across = g * k * 4 * n;
  double along = g * s * (1 + k * (vx * vx + vy * vy - 4 * m));
  *ax = across * vx - along * x;
  *ay = across * vy - along * y;
}

int rk4_post_newtonian(double *io, const double *parameters, double h, int steps) {
  double GM = parameters[0], k = 1 / (parameters[1] * parameters[1]);
  double x = io[0], y = io[1], vx = io[2], vy = io[3], rate = io[8];
  double ox = x, oy = y, ovx = vx, ovy = vy;
  const double a = 1.0 / 6, b = 1.0 / 3;
  int taken = 0;
  while (taken < steps) {
    double ax1, ay1, ax2, ay2, ax3, ay3, ax4, ay4;
    post_newtonian(x, y, vx, vy, GM, k, &ax1, &ay1);
    double x2 = x + h * (0.5 * vx), y2 = y + h * (0.5 * vy);
    double vx2 = vx + h * (0.5 * ax1), vy2 = vy + h * (0.5 * ay1);
    post_newtonian(x2, y2, vx2, vy2, GM, k, &ax2, &ay2);
    double x3 = x + h * (0.5 * vx2), y3 = y + h * (0.5 * vy2);
    double vx3 = vx + h * (0.5 * ax2), vy3 = vy + h * (0.5 * ay2);
    post_newtonian(x3, y3, vx3, vy3, GM, k, &ax3, &ay3);
    double x4 = x + h * vx3, y4 = y + h * vy3;
    double vx4 = vx + h * ax3, vy4 = vy + h * ay3;
    post_newtonian(x4, y4, vx4, vy4, GM, k, &ax4, &ay4);
    ox = x, oy = y, ovx = vx, ovy = vy;
    x += h * (a * vx + b * vx2 + b * vx3 + a * vx4);
    y += h * (a * vy + b * vy2 + b * vy3 + a * vy4);
    vx += h * (a * ax1 + b * ax2 + b * ax3 + a * ax4);
    vy += h * (a * ay1 + b * ay2 + b * ay3 + a * ay4);
    double before = rate;
    rate = x * vx + y * vy;
    taken++;
    if (before < 0 && rate >= 0) break;
  }
  io[0] = x, io[1] = y, io[2] = vx, io[3] = vy;
  io[4] = ox, io[5] = oy, io[6] = ovx, io[7] = ovy;
  io[8] = rate, io[9] = taken * 4, io[10] = 0;
  return taken;
}

int leapfrog_newtonian(double *io, const double *parameters, double h, int steps) {
  double GM = parameters[0], half = 0.5 * h;
  double x = io[0], y = io[1], vx = io[2], vy = io[3], rate = io[8];
  double ox = x, oy = y, ovx = vx, ovy = vy;
  double s = 1 / sqrt(x * x + y * y), g = GM * (s * s) * s;
  double ax = -(g * x), ay = -(g * y);
  int taken = 0;
  while (taken < steps) {
    ox = x, oy = y, ovx = vx, ovy = vy;
    vx += half * ax;
    vy += half * ay;
    x += h * vx;
    y += h * vy;
    s = 1 / sqrt(x * x + y * y);
    g = GM * (s * s) * s;
    ax = -(g * x);
    ay = -(g * y);
    vx += half * ax;
    vy += half * ay;
    double before = rate;
    rate = x * vx + y * vy;
    taken++;
    if (before < 0 && rate >= 0) break;
  }
  io[0] = x, io[1] = y, io[2] = vx, io[3] = vy;
  io[4] = ox, io[5] = oy, io[6] = ovx, io[7] = ovy;
  io[8] = rate, io[9] = 1 + taken, io[10] = 0;
  return taken;
}
