package org.solewright.analysis.numerics;

/** Elliptic integrals in the symmetric form of Carlson, which neither overflows nor cancels [Carlson 1979]. */
public final class EllipticIntegral {

    /** The truncation error is of the sixth power: 1e-18. */
    private static final double TOLERANCE = 1e-3;

    private static final int MOST_DOUBLINGS = 200;

    private EllipticIntegral() {}

    /**
     * Symmetric integral of the first kind, 1/2 int_0^inf dt / sqrt((t+x)(t+y)(t+z)).
     *
     * @param x not negative
     * @param y not negative; at most one of the three is 0
     * @param z not negative
     * @return its value
     */
    public static double symmetricFirstKind(double x, double y, double z) {
        double a = x;
        double b = y;
        double c = z;
        for (int i = 0; i < MOST_DOUBLINGS; i++) {
            double mean = (a + b + c) / 3;
            double da = (mean - a) / mean;
            double db = (mean - b) / mean;
            double dc = (mean - c) / mean;
            if (Math.max(Math.abs(da), Math.max(Math.abs(db), Math.abs(dc))) < TOLERANCE) {
                double e2 = da * db - dc * dc;
                double e3 = da * db * dc;
                return (1 + (e2 / 24 - 0.1 - 3 * e3 / 44) * e2 + e3 / 14) / Math.sqrt(mean);
            }
            double sa = Math.sqrt(a);
            double sb = Math.sqrt(b);
            double sc = Math.sqrt(c);
            double lambda = sa * (sb + sc) + sb * sc;
            a = (a + lambda) / 4;
            b = (b + lambda) / 4;
            c = (c + lambda) / 4;
        }
        return Double.POSITIVE_INFINITY;
    }

    /**
     * Symmetric integral of the second kind, 3/2 int_0^inf dt / (sqrt((t+x)(t+y)) (t+z)^(3/2)).
     *
     * @param x not negative
     * @param y not negative; at most one of x and y is 0
     * @param z above 0
     * @return its value
     */
    public static double symmetricSecondKind(double x, double y, double z) {
        double a = x;
        double b = y;
        double c = z;
        double sum = 0;
        double factor = 1;
        for (int i = 0; i < MOST_DOUBLINGS; i++) {
            double mean = (a + b + 3 * c) / 5;
            double da = (mean - a) / mean;
            double db = (mean - b) / mean;
            double dc = (mean - c) / mean;
            if (Math.max(Math.abs(da), Math.max(Math.abs(db), Math.abs(dc))) < TOLERANCE) {
                double ea = da * db;
                double eb = dc * dc;
                double ec = ea - eb;
                double ed = ea - 6 * eb;
                double ee = ed + ec + ec;
                double series = 1
                        + ed * (-3.0 / 14 + 9.0 / 88 * ed - 4.5 / 26 * dc * ee)
                        + dc * (ee / 6 + dc * (-9.0 / 22 * ec + dc * 3.0 / 26 * ea));
                return 3 * sum + factor * series / (mean * Math.sqrt(mean));
            }
            double sa = Math.sqrt(a);
            double sb = Math.sqrt(b);
            double sc = Math.sqrt(c);
            double lambda = sa * (sb + sc) + sb * sc;
            sum += factor / (sc * (c + lambda));
            factor /= 4;
            a = (a + lambda) / 4;
            b = (b + lambda) / 4;
            c = (c + lambda) / 4;
        }
        return Double.POSITIVE_INFINITY;
    }

    /**
     * Incomplete integral of the first kind F(angle | m).
     *
     * @param angle rad, within pi/2 of 0
     * @param m parameter, below 1 / sin^2 angle
     * @return its value, of the angle's sign
     */
    public static double first(double angle, double m) {
        double sine = Math.sin(angle);
        double cosine = Math.cos(angle);
        return sine * symmetricFirstKind(cosine * cosine, 1 - m * sine * sine, 1);
    }

    /**
     * Incomplete integral of the second kind E(angle | m).
     *
     * @param angle rad, within pi/2 of 0
     * @param m parameter, below 1 / sin^2 angle
     * @return its value, of the angle's sign
     */
    public static double second(double angle, double m) {
        double sine = Math.sin(angle);
        double cosine = Math.cos(angle);
        double y = 1 - m * sine * sine;
        return sine * symmetricFirstKind(cosine * cosine, y, 1)
                - m * sine * sine * sine * symmetricSecondKind(cosine * cosine, y, 1) / 3;
    }
}
