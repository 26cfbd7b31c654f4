package org.solewright.formats.c3d;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.geometry.Vec3;

/**
 * From the channels of a platform to three forces and three moments about its measuring origin, in platform axes and the
 * file's units (type 1: forces, centre of pressure, free moment).
 *
 * <p>Types 1 and 2 hold six channels as they are. Types 4, 5, 6 and 7 are multiplied by CAL_MATRIX first, which is stored
 * column by column: 4 from six channels to six, 5 from eight to six, 7 from eight to the eight of type 3, 6 from twelve to
 * six or to twelve. Type 3 holds the horizontal forces of two pairs each and four vertical ones; twelve channels are three
 * forces of each of four sensors. The sensors stand at (a, b), (-a, b), (-a, -b), (a, -b) with a and b from ORIGIN 1, 2.
 */
final class PlatformChannels {

    private static final int SIX = 6;
    private static final int EIGHT = 8;
    private static final int TWELVE = 12;
    private static final int MOST_TYPE = 7;
    private static final int[] WIDTHS = {0, SIX, SIX, EIGHT, SIX, EIGHT, TWELVE, EIGHT};

    private final int type;
    private final int width;
    private final int rows;
    private final double[] matrix;

    private PlatformChannels(int type, int width, int rows, double[] matrix) {
        this.type = type;
        this.width = width;
        this.rows = rows;
        this.matrix = matrix;
    }

    /** Whether there is such a type. */
    static boolean knows(int type) {
        return type >= 1 && type <= MOST_TYPE;
    }

    /** The channels of a platform of a known type; empty where its calibration matrix is missing. */
    static Optional<PlatformChannels> of(C3dPlatform p) {
        int width = WIDTHS[p.type()];
        if (p.type() <= 3) {
            return Optional.of(new PlatformChannels(p.type(), width, width, new double[0]));
        }
        List<Double> stored = p.calibration();
        int rows = p.type() == 7 ? EIGHT : p.type() == 6 && stored.size() >= TWELVE * TWELVE ? TWELVE : SIX;
        if (stored.size() < rows * width) {
            boolean isPlain = p.type() == 6 && stored.isEmpty();
            return isPlain
                    ? Optional.of(new PlatformChannels(p.type(), width, width, new double[0]))
                    : Optional.empty();
        }
        // A matrix whose first dimension counts the channels lies row by row.
        boolean isByRows = p.calibrationRows() == width && rows != width;
        double[] matrix = new double[rows * width];
        for (int row = 0; row < rows; row++) {
            for (int column = 0; column < width; column++) {
                matrix[row * width + column] = stored.get(isByRows ? row * width + column : column * rows + row);
            }
        }
        return Optional.of(new PlatformChannels(p.type(), width, rows, matrix));
    }

    /** The size of the matrix that a type needs, for messages. */
    static String neededMatrix(int type) {
        return (type == 7 ? EIGHT : SIX) + " x " + WIDTHS[type];
    }

    /** Number of channels. */
    int width() {
        return width;
    }

    /** Number of channels of a type. */
    static int width(int type) {
        return WIDTHS[type];
    }

    /** Whether ORIGIN 1 and 2 are the sensors' distances from the centre, not a place. */
    boolean hasSensorDistances() {
        return rows != SIX;
    }

    /** Whether channels 4 and 5 are the centre of pressure itself. */
    boolean isPressureCentre() {
        return type == 1;
    }

    /**
     * Forces and moments of one sample.
     *
     * @param c samples of the channels, unmodified
     * @param at first channel of the sample
     * @param o ORIGIN
     * @param w receives three forces, three moments
     */
    void six(double[] c, int at, Vec3 o, double[] w) {
        if (matrix.length == 0) {
            combine(c, at, o, w);
            return;
        }
        double[] calibrated = new double[rows];
        for (int row = 0; row < rows; row++) {
            double sum = 0;
            for (int column = 0; column < width; column++) {
                sum += matrix[row * width + column] * c[at + column];
            }
            calibrated[row] = sum;
        }
        combine(calibrated, 0, o, w);
    }

    private void combine(double[] c, int at, Vec3 o, double[] w) {
        if (rows == EIGHT) {
            eight(c, at, o.x(), o.y(), w);
        } else if (rows == TWELVE) {
            twelve(c, at, o.x(), o.y(), w);
        } else {
            System.arraycopy(c, at, w, 0, SIX);
        }
    }

    private static void eight(double[] c, int at, double a, double b, double[] w) {
        w[0] = c[at] + c[at + 1];
        w[1] = c[at + 2] + c[at + 3];
        w[2] = c[at + 4] + c[at + 5] + c[at + 6] + c[at + 7];
        w[3] = b * (c[at + 4] + c[at + 5] - c[at + 6] - c[at + 7]);
        w[4] = a * (-c[at + 4] + c[at + 5] + c[at + 6] - c[at + 7]);
        w[5] = b * (-c[at] + c[at + 1]) + a * (c[at + 2] - c[at + 3]);
    }

    private static void twelve(double[] c, int at, double a, double b, double[] w) {
        Arrays.fill(w, 0);
        for (int sensor = 0; sensor < 4; sensor++) {
            double fx = c[at + 3 * sensor];
            double fy = c[at + 3 * sensor + 1];
            double fz = c[at + 3 * sensor + 2];
            double x = sensor == 0 || sensor == 3 ? a : -a;
            double y = sensor < 2 ? b : -b;
            w[0] += fx;
            w[1] += fy;
            w[2] += fz;
            w[3] += y * fz;
            w[4] -= x * fz;
            w[5] += x * fy - y * fx;
        }
    }
}
