/* Plain shock response spectrum, recursive filter and largest sample, for comparison: prints the ms of each round. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

int main(int count, char **arguments) {
  int n = atoi(arguments[1]), frequencies = atoi(arguments[2]), rounds = atoi(arguments[3]);
  double top = atof(arguments[4]), *p = malloc(n * sizeof *p), sum = 0;
  long long state = 12345;
  (void)count;
  for (int i = 0; i < n; i++) {
    state = state * 16807 % 2147483647;
    p[i] = state / 1073741823.5 - 1;
  }
  for (int round = -2; round < rounds; round++) {
    struct timespec from, to;
    clock_gettime(CLOCK_MONOTONIC, &from);
    for (int k = 0; k < frequencies; k++) {
      double fn = 10 * pow(top / 10, k / (frequencies - 1.0)), zeta = 0.05, w = 2 * M_PI * fn / 20000;
      double wd = w * sqrt(1 - zeta * zeta), E = exp(-zeta * w), C = E * cos(wd), S = E * sin(wd) / wd;
      double b0 = 1 - S, b1 = 2 * (S - C), b2 = E * E - S, a1 = 2 * C, a2 = -E * E;
      double x1 = 0, x2 = 0, y1 = 0, y2 = 0, most = 0;
      for (int i = 0; i < n; i++) {
        double y = b0 * p[i] + b1 * x1 + b2 * x2 + a1 * y1 + a2 * y2, size = fabs(y);
        x2 = x1, x1 = p[i], y2 = y1, y1 = y;
        if (size > most) most = size;
      }
      sum += most;
    }
    clock_gettime(CLOCK_MONOTONIC, &to);
    if (round >= 0) printf("%.4f\n", (to.tv_sec - from.tv_sec) * 1e3 + (to.tv_nsec - from.tv_nsec) / 1e6);
  }
  fprintf(stderr, "%g\n", sum); /* so that the work is needed */
  return 0;
}
