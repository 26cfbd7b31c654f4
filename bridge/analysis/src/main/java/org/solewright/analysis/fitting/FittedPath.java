package org.solewright.analysis.fitting;

/** Places of a time-ordered path and the samples at which one takes over from the other. */
public final class FittedPath {

    private final double[] x;
    private final double[] y;
    private final int[] cuts;
    private final double squares;

    FittedPath(double[] x, double[] y, int[] cuts, double squares) {
        this.x = x;
        this.y = y;
        this.cuts = cuts;
        this.squares = squares;
    }

    /**
     * Number of places: pivots, or vertices of the polyline.
     *
     * @return 1 or more
     */
    public int places() {
        return x.length;
    }

    /**
     * First coordinate of a place.
     *
     * @param place zero-based, in the order of time
     * @return m
     */
    public double x(int place) {
        return x[place];
    }

    /**
     * Second coordinate of a place.
     *
     * @param place zero-based, in the order of time
     * @return m
     */
    public double y(int place) {
        return y[place];
    }

    /**
     * For pivots the first sample of run {@code index}, the number of samples for the last index, so that there is one
     * cut more than pivots; for a polyline the sample at which vertex {@code index} lies.
     *
     * @param index zero-based
     * @return sample
     */
    public int cut(int index) {
        return cuts[index];
    }

    /**
     * Number of cuts.
     *
     * @return pivots + 1, or vertices of the polyline
     */
    public int cuts() {
        return cuts.length;
    }

    /**
     * Weighted sum of squared distances.
     *
     * @return in the unit of the weights times m^2
     */
    public double sumOfSquares() {
        return squares;
    }
}
