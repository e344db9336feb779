package turnsheet.core.diagnose.wheel;

import java.util.Arrays;

/**
 * A shaft whose mean speed rises while a torque, which repeats with the turn and works on an
 * inertia, makes it swing: by a share of the speed that falls with the square of the speed.
 *
 * @param pulsesPerSecond in the middle of the capture
 * @param riseShare by which the mean speed rises over the capture
 * @param peak swing of the relative speed at the middle
 */
record Torque(int places, double pulsesPerSecond, double seconds, double riseShare, double peak) {

  /** Runge-Kutta of fourth order in steps of a fifth of a period: errors below 1e-9 periods. */
  private static final int STEPS = 5;

  double[] edges(double[] latePeriods) {
    double[] times = new double[(int) (2 * seconds * pulsesPerSecond)];
    int n = 0;
    double angle = 0;
    double t = 0;
    while (t < seconds) {
      double to = n + 1 + latePeriods[(n + 1) % places];
      double h = (to - angle) / STEPS;
      for (int i = 0; i < STEPS; i++) {
        double k1 = secondsPerPeriod(t, angle);
        double k2 = secondsPerPeriod(t + h / 2 * k1, angle + h / 2);
        double k3 = secondsPerPeriod(t + h / 2 * k2, angle + h / 2);
        double k4 = secondsPerPeriod(t + h * k3, angle + h);
        t += h / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
        angle += h;
      }
      times[n++] = t;
    }
    return Arrays.copyOf(times, n);
  }

  private double secondsPerPeriod(double t, double angle) {
    double mean = 1 + riseShare * (t / seconds - 0.5);
    double swing = peak / (mean * mean) * Math.sin(2 * Math.PI * angle / places);
    return 1 / (pulsesPerSecond * mean * (1 + swing));
  }
}
