package org.solewright.analysis.dynamics;

/** A stretch of the hip's path with exact derivatives. */
sealed interface HipPhase {

    /** Index of x in a state, m; then z, m; their first and second derivatives follow. */
    int X = 0;
    /** Index of z. */
    int Z = 1;
    /** Index of dx/dt. */
    int VX = 2;
    /** Index of dz/dt. */
    int VZ = 3;
    /** Index of d2x/dt2. */
    int AX = 4;
    /** Index of d2z/dt2. */
    int AZ = 5;
    /** Numbers of a state. */
    int STATE = 6;

    /** How long it lasts, s. */
    double duration();

    /** Fills position, velocity and acceleration at a time from its start. */
    void state(double time, double[] out);

    /** Position, velocity and acceleration on the circle about a pivot at a lean and its rate. */
    static void onCircle(double pivot, double radius, double gravity, double lean, double rate, double[] out) {
        double sin = Math.sin(lean);
        double cos = Math.cos(lean);
        double pull = gravity / radius * sin;
        out[X] = pivot + radius * sin;
        out[Z] = radius * cos;
        out[VX] = radius * rate * cos;
        out[VZ] = -radius * rate * sin;
        out[AX] = radius * (pull * cos - rate * rate * sin);
        out[AZ] = -radius * (pull * sin + rate * rate * cos);
    }

    /** The hip on the circle about a pivot, moved by gravity alone: theta'' = (g/l) sin theta. */
    final class Vault implements HipPhase {

        private static final int LEAST_CELLS = 4;
        private static final int MOST_CELLS = 2000;
        private static final int MOST_STEPS = 100;
        private static final double ROUNDING = 1e-15;

        private final Quadrature quadrature;
        private final double pivot;
        private final double radius;
        private final double gravity;
        private final double topRateSquared;
        private final double from;
        private final double to;
        private final int cells;
        private final double duration;

        /**
         * A vault.
         *
         * @param pivot x of the pivot, m
         * @param radius m
         * @param gravity m/s2
         * @param topRateSquared square of the lean's rate at the top, 1/s2, above 0
         * @param from lean at the start, rad
         * @param to lean at the end, rad
         */
        Vault(
                Quadrature quadrature,
                double pivot,
                double radius,
                double gravity,
                double topRateSquared,
                double from,
                double to) {
            this.quadrature = quadrature;
            this.pivot = pivot;
            this.radius = radius;
            this.gravity = gravity;
            this.topRateSquared = topRateSquared;
            this.from = from;
            this.to = to;
            // 1/rate has a pole this far from the top in the complex plane; cells are kept a quarter of it.
            double pole = Math.sqrt(topRateSquared * radius / gravity);
            this.cells = (int) Math.min(Math.max(Math.ceil(2 * (to - from) / pole), LEAST_CELLS), MOST_CELLS);
            this.duration = time(to);
        }

        private double rate(double lean) {
            double half = Math.sin(lean / 2);
            return Math.sqrt(topRateSquared + 4 * gravity / radius * half * half);
        }

        private double time(double lean) {
            return quadrature.integral(a -> 1 / rate(a), from, lean, cells);
        }

        @Override
        public double duration() {
            return duration;
        }

        @Override
        public void state(double time, double[] out) {
            double lean = lean(time);
            onCircle(pivot, radius, gravity, lean, rate(lean), out);
        }

        /** Newton's method on the time of a lean, kept between the ends by bisection. */
        double lean(double time) {
            double low = from;
            double high = to;
            double lean = from + (to - from) * Math.min(Math.max(time / duration, 0), 1);
            for (int i = 0; i < MOST_STEPS; i++) {
                double miss = time(lean) - time;
                if (miss > 0) {
                    high = lean;
                } else {
                    low = lean;
                }
                double next = lean - miss * rate(lean);
                if (!(next > low && next < high)) {
                    next = (low + high) / 2;
                }
                double step = Math.abs(next - lean);
                lean = next;
                if (step < ROUNDING) {
                    break;
                }
            }
            return lean;
        }

        double leanRate(double lean) {
            return rate(lean);
        }
    }

    /** From one circle to the next along quintics in both coordinates. */
    final class Bridge implements HipPhase {

        private final double duration;
        private final Quintic x;
        private final Quintic z;

        Bridge(double duration, double[] start, double[] end) {
            this.duration = duration;
            this.x = quintic(duration, start, end, X);
            this.z = quintic(duration, start, end, Z);
        }

        private static Quintic quintic(double duration, double[] start, double[] end, int axis) {
            return new Quintic(duration, new double[] {start[axis], start[axis + VX], start[axis + AX]}, new double[] {
                end[axis], end[axis + VX], end[axis + AX]
            });
        }

        @Override
        public double duration() {
            return duration;
        }

        @Override
        public void state(double time, double[] out) {
            out[X] = x.value(time);
            out[Z] = z.value(time);
            out[VX] = x.slope(time);
            out[VZ] = z.slope(time);
            out[AX] = x.curvature(time);
            out[AZ] = z.curvature(time);
        }
    }
}
