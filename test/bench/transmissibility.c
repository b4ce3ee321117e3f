/* Plain absolute transmissibility over columns, for comparison: prints the milliseconds of each round. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

int main(int count, char **arguments) {
  int n = atoi(arguments[1]), rounds = atoi(arguments[2]);
  double *f = malloc(n * sizeof *f), *fn = malloc(n * sizeof *fn);
  double *zeta = malloc(n * sizeof *zeta), *out = malloc(n * sizeof *out);
  double sum = 0;
  (void)count;
  for (int i = 0; i < n; i++) {
    f[i] = 1 + (i % 9973) * 0.01;
    fn[i] = 5 + (i % 4999) * 0.002;
    zeta[i] = 0.01 + (i % 997) * 0.001;
  }
  for (int round = -2; round < rounds; round++) {
    struct timespec from, to;
    clock_gettime(CLOCK_MONOTONIC, &from);
    for (int i = 0; i < n; i++) {
      double r = f[i] / fn[i], q = 1 - r * r, b = 2 * zeta[i] * r;
      out[i] = sqrt((1 + b * b) / (q * q + b * b));
    }
    clock_gettime(CLOCK_MONOTONIC, &to);
    sum += out[(round + 2) % n];
    if (round >= 0) printf("%.4f\n", (to.tv_sec - from.tv_sec) * 1e3 + (to.tv_nsec - from.tv_nsec) / 1e6);
  }
  fprintf(stderr, "%g\n", sum); /* so that the work is needed */
  return 0;
}
